import { SectionHead } from "@withy/ui/section-head";
import type { ReactNode } from "react";

/** One part of the style sheet with its margin note. */
export function Section({
  title,
  note,
  aside,
  children,
}: {
  title: string;
  note: string;
  aside?: string;
  children: ReactNode;
}) {
  return (
    <div className="guide-section">
      <p className="note gut">{note}</p>
      <div>
        <SectionHead title={title} aside={aside} />
        <div className="guide-body">{children}</div>
      </div>
    </div>
  );
}
