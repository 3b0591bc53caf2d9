"use client";
import { formatMoney } from "@withy/core/money";
import { AlertLine } from "@withy/ui/alert-line";
import { ButtonLink } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { useFilterAddress } from "../hooks/use-filter-address";
import { type FirstList, useAgedDebt, useInvoices } from "../hooks/use-invoices";
import { AccountsFilters, type SiteOption } from "./accounts-filters";
import { InvoiceTable } from "./invoice-table";
import { ListPager } from "./list-pager";

export interface AccountsScreenProps {
  first: FirstList;
  sites: readonly SiteOption[];
  /** Null where this person may not draft. */
  toIssue: { count: number; pence: number } | null;
}

/** Who owes, oldest first: the filter is in the address, the sums are of all that it keeps. */
export function AccountsScreen({ first, sites, toIssue }: AccountsScreenProps) {
  const { filter, change } = useFilterAddress();
  const invoices = useInvoices(filter, first);
  const aged = useAgedDebt(filter.siteId, first).data ?? first.aged;
  const list = invoices.data ?? first.list;
  const old = aged.buckets.find((b) => b.bucket === "over-90")?.pence ?? 0;
  const lead = `${aged.count} invoices, ${formatMoney(aged.totalPence)}; ${formatMoney(old)} of it past 90 days.`;
  return (
    <Page className="accs">
      <PageTitle
        title={filter.kind === "owed" || filter.kind === "overdue" ? "Owed to us" : "Invoices"}
        lead={lead}
        actions={
          toIssue && (
            <ButtonLink as={Link} href="/billing/drafts" kind="primary" size="small">
              {toIssue.count === 0 ? "Drafts" : `To issue: ${toIssue.count}, ${formatMoney(toIssue.pence)}`}
            </ButtonLink>
          )
        }
      />
      <AccountsFilters
        filter={filter}
        change={change}
        aged={aged}
        sites={sites}
        kept={list.filterSums.count}
      />
      {invoices.error && (
        <div className="body">
          <AlertLine tone="danger">{invoices.error.message}</AlertLine>
        </div>
      )}
      {list.rows.length === 0 ? (
        <div className="body">
          <EmptyState title="No invoice fits this filter.">
            <Link href="/billing">Show all that is owed</Link>
          </EmptyState>
        </div>
      ) : (
        <InvoiceTable list={list} kind={filter.kind} isStale={invoices.isPlaceholderData} />
      )}
      <ListPager list={list} onPage={(page) => change({ page })} />
    </Page>
  );
}
