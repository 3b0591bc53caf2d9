import { Mark } from "@withy/ui/mark";
import type { ReactNode } from "react";

/** The cover: sign-in, links from e-mails, and pages that are not there. */
export function PlainPage({
  title,
  lead,
  children,
}: {
  title: string;
  lead?: ReactNode;
  children: ReactNode;
}) {
  return (
    <main className="cover" id="main">
      <a className="covermark" href="/" aria-label="Withy, to the start">
        <Mark />
        <span>Withy</span>
      </a>
      <div className="coversheet">
        <h1>{title}</h1>
        {lead && <p className="soft">{lead}</p>}
        {children}
      </div>
    </main>
  );
}
