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
    <div className="cover">
      <div className="covermark" aria-hidden="true">
        <Mark />
      </div>
      <main className="coversheet" id="main">
        <p className="covername">
          <a href="/">Withy</a>
        </p>
        <p className="coversub">The day's book of your clinics</p>
        <h1>{title}</h1>
        {lead && <p className="soft">{lead}</p>}
        {children}
      </main>
    </div>
  );
}
