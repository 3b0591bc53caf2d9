import type { ReactNode } from "react";
import { classNames } from "./class-names";

export interface LineProps {
  /** What stands in the gutter: a time, a rank, a tick box, a margin note. */
  gutter?: ReactNode;
  /** A small tick joins the gutter's time to the line. */
  tick?: boolean;
  /** The gutter holds a margin note rather than a time. */
  note?: boolean;
  chosen?: boolean;
  className?: string;
  children: ReactNode;
}

/** One ruled line of a list, with its gutter. */
export function Line({ gutter, tick = false, note = false, chosen = false, className, children }: LineProps) {
  return (
    <div className="line" data-chosen={chosen ? "" : undefined}>
      <div className={classNames("gut", tick && "tick", note && "note")}>{gutter}</div>
      <div className={classNames("in", className)}>{children}</div>
    </div>
  );
}

/** The present minute across a list: the only thing that shouts. */
export function NowLine({ time }: { time: string }) {
  return (
    <div className="nowline">
      <span className="now-tab">
        <span className="vh">Now, </span>
        {time}
      </span>
    </div>
  );
}
