import { can } from "@withy/core/access/can";
import { getAgedDebt, listInvoices, listToIssue } from "@withy/services/billing";
import { listSites } from "@withy/services/practices";
import type { Metadata } from "next";
import { AccountsScreen } from "@/features/billing/components/accounts-screen";
import { readFilterAddress, toListInput } from "@/features/billing/filter-address";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/billing/accounts.css";
import "@/features/billing/accounts-narrow.css";

export const metadata: Metadata = { title: "Accounts" };

export default async function AccountsPage({ searchParams }: PageProps<"/billing">) {
  const ctx = await requireContext("billing.read");
  const query = new URLSearchParams();
  for (const [key, value] of Object.entries(await searchParams)) {
    if (typeof value === "string") query.set(key, value);
  }
  const filter = readFilterAddress(query);
  const mayDraft = can(ctx.roles, "billing.draft");
  const [list, aged, sites, toIssue] = await Promise.all([
    orNotFound(listInvoices(ctx, toListInput(filter))),
    orNotFound(getAgedDebt(ctx, filter.siteId === undefined ? {} : { siteId: filter.siteId })),
    listSites(ctx, {}),
    mayDraft ? listToIssue(ctx, {}) : null,
  ]);
  return (
    <AccountsScreen
      first={{ filter, list, aged }}
      sites={sites
        .filter((s) => can(ctx.roles, "billing.read", s.id))
        .map((s) => ({ id: s.id, name: s.name }))}
      toIssue={
        toIssue && {
          count: toIssue.drafts.length + toIssue.visits.length,
          pence: toIssue.draftsTotalPence + toIssue.visitsTotalPence,
        }
      }
    />
  );
}
