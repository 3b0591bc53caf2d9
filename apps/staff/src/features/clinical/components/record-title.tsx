import { PageBody } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import type { ReactNode } from "react";

/** The title of one part of a patient's record, under the tabs. */
export function RecordTitle({
  title,
  aside,
  action,
}: {
  title: ReactNode;
  aside?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <PageBody className="section-line">
      <SectionHead title={title} aside={aside} action={action} />
    </PageBody>
  );
}
