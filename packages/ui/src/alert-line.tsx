import type { ReactNode } from "react";
import { Glyph } from "./glyph";

export interface AlertLineProps {
  tone?: "warning" | "danger" | "ok";
  /** Interrupts a reader at once; only for what the person has just caused. */
  live?: boolean;
  children: ReactNode;
}

/** One line that must be read before going on: an edge, a sign and a sentence that says what to do. */
export function AlertLine({ tone = "warning", live = false, children }: AlertLineProps) {
  return (
    <div className="alert" data-tone={tone} role={live ? "alert" : undefined}>
      <Glyph name={tone === "ok" ? "tick" : "warn"} />
      <div>{children}</div>
    </div>
  );
}
