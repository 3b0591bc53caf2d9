import type { ReactNode } from "react";
import { classNames } from "./class-names";

export interface PageProps {
  /** The page fits its window and scrolls inside its parts. */
  fit?: boolean;
  className?: string;
  children: ReactNode;
}

/** The open page: gutter on the left, sheet on the right. Holds the one `main` of the document. */
export function Page({ fit = false, className, children }: PageProps) {
  return (
    <main id="main" tabIndex={-1} className={classNames("page", className)} data-fit={fit ? "" : undefined}>
      {children}
    </main>
  );
}

export interface PageTitleProps {
  title: ReactNode;
  /** A margin note beside the title. */
  note?: ReactNode;
  /** One soft sentence after the title. */
  lead?: ReactNode;
  /** What follows at once: step buttons, a date field. */
  beside?: ReactNode;
  /** What stands at the right end: view choice, the main button. */
  actions?: ReactNode;
}

/** The title line with its gutter. */
export function PageTitle({ title, note, lead, beside, actions }: PageTitleProps) {
  return (
    <header className="title">
      <div className="gut note">{note}</div>
      <div className="in">
        <h1>{title}</h1>
        {beside}
        {lead && <p className="lead">{lead}</p>}
        {actions && (
          <>
            <span className="grow" />
            {actions}
          </>
        )}
      </div>
    </header>
  );
}

/** The sheet's own margins for content that has no gutter of its own. */
export function PageBody({ className, children }: { className?: string; children: ReactNode }) {
  return <div className={classNames("body", className)}>{children}</div>;
}
