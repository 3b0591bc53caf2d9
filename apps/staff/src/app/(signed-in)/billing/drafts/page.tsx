import { can } from "@withy/core/access/can";
import { dayOf } from "@withy/core/zoned-time";
import { listToIssue } from "@withy/services/billing";
import type { Metadata } from "next";
import { DraftsScreen } from "@/features/billing/components/drafts-screen";
import { requireContext } from "@/server/context";
import "@/features/billing/accounts.css";
import "@/features/billing/accounts-narrow.css";

export const metadata: Metadata = { title: "To issue" };

export default async function DraftsPage() {
  const ctx = await requireContext("billing.draft");
  return (
    <DraftsScreen
      first={await listToIssue(ctx, {})}
      today={dayOf(ctx.clock.now(), ctx.zone)}
      may={{ draft: true, issue: can(ctx.roles, "billing.issue") }}
    />
  );
}
