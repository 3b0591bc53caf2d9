import type { ReactNode } from "react";

/** The strip at the foot of a working page: what was put aside on the left, what was last done on the right. */
export function Tray({
  gutter,
  said,
  children,
}: {
  gutter?: ReactNode;
  said?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <footer className="tray">
      <span className="gut">{gutter}</span>
      <div>{children}</div>
      {said && <div className="said">{said}</div>}
    </footer>
  );
}
