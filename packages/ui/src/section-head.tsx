import type { ReactNode } from "react";

export interface SectionHeadProps {
  title: ReactNode;
  /** Put the same id on the section's `aria-labelledby`. */
  id?: string;
  aside?: ReactNode;
  action?: ReactNode;
  level?: 2 | 3;
}

/** A heading on an ink line, with a soft aside and at most one action at the right. */
export function SectionHead({ title, id, aside, action, level = 2 }: SectionHeadProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className="sect">
      <Heading id={id}>{title}</Heading>
      {aside && <span className="aside num">{aside}</span>}
      {action && (
        <>
          <span className="grow" />
          {action}
        </>
      )}
    </div>
  );
}
