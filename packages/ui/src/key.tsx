import type { ReactNode } from "react";

/** A key as printed on the keyboard. Shown beside the verb that it does. */
export function Key({ children }: { children: ReactNode }) {
  return <kbd className="kbd">{children}</kbd>;
}
