import "@/features/practices/practices.css";
import { can } from "@withy/core/access/can";
import { isId } from "@withy/core/ids";
import { dayOf } from "@withy/core/zoned-time";
import { listStaff } from "@withy/services/practices";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import type { Metadata } from "next";
import { AuditBrowser } from "@/features/practices/components/audit-browser";
import { requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Who did what" };

export default async function AuditPage({ searchParams }: PageProps<"/settings/audit">) {
  const ctx = await requireContext("audit.read");
  const patientId = (await searchParams)["patientId"];
  const staff = can(ctx.roles, "staff.manage") ? await listStaff(ctx, {}) : [];
  return (
    <Page>
      <PageTitle
        title="Who did what"
        lead="Every change and every opening of a record. It cannot be edited."
      />
      <PageBody>
        <AuditBrowser
          staff={staff.map(({ id, name }) => ({ id, name }))}
          patientId={isId(patientId) ? patientId : null}
          today={dayOf(ctx.clock.now(), ctx.zone)}
        />
      </PageBody>
    </Page>
  );
}
