import type { ReactNode } from "react";

/** A short note in the margin about the line that it stands beside. Never the only place of a fact. */
export function GutterNote({ children }: { children: ReactNode }) {
  return <aside className="note gut">{children}</aside>;
}
