"use client";
import type { ToIssueView } from "@withy/contracts/billing";
import { formatMoney, sumPence } from "@withy/core/money";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useIssueMany } from "../hooks/use-issue-many";
import { useToIssue } from "../hooks/use-to-issue";
import { DraftTable } from "./draft-table";
import { VisitsToInvoice } from "./visits-to-invoice";

interface DraftsScreenProps {
  first: ToIssueView;
  today: string;
  may: { draft: boolean; issue: boolean };
}

/** From attended visits to drafts, from drafts to invoices. */
export function DraftsScreen({ first, today, may }: DraftsScreenProps) {
  const { drafts, draftsTotalPence, visits, visitsTotalPence, areMoreVisits, drafting } = useToIssue(first);
  const [chosenIds, setChosenIds] = useState<readonly string[]>([]);
  const issue = useIssueMany();
  const chosen = drafts.filter((d) => chosenIds.includes(d.id));
  const sum = formatMoney(sumPence(chosen.map((d) => d.totalPence)));
  const isBusy = issue.done !== null;
  const run = async () => {
    await issue.run(chosen);
    setChosenIds([]);
  };
  useShortcut("issue", () => void run(), may.issue && chosen.length > 0 && !isBusy);
  const lead = `${drafts.length} drafts, ${formatMoney(draftsTotalPence)}; ${visits.length} visits on no draft yet, ${formatMoney(visitsTotalPence)}.`;
  return (
    <Page className="drafts">
      <PageTitle
        title="To issue"
        lead={lead}
        actions={
          may.issue && (
            <Button
              kind="primary"
              shortcut="I"
              disabled={chosen.length === 0}
              busy={isBusy}
              onClick={() => void run()}
            >
              {chosen.length === 0 ? "Choose drafts to issue" : `Issue ${chosen.length}, ${sum}`}
            </Button>
          )
        }
      />
      <div aria-live="polite" className="body issuing">
        {issue.done && `Issuing ${issue.done.count + 1} of ${issue.done.of}`}
        {issue.problems.map((p) => (
          <AlertLine key={p.draftId} tone="danger">
            <Link href={`/billing/invoices/${p.draftId}`}>
              {drafts.find((d) => d.id === p.draftId)?.patientName ?? "A draft"}
            </Link>
            : {p.message}
          </AlertLine>
        ))}
      </div>
      {drafts.length === 0 ? (
        <div className="body">
          <EmptyState title="No draft waits to be issued.">
            <Link href="/billing">See who owes</Link>
          </EmptyState>
        </div>
      ) : (
        <DraftTable
          drafts={drafts}
          totalPence={draftsTotalPence}
          today={today}
          chosenIds={chosenIds}
          onChoose={may.issue ? setChosenIds : null}
        />
      )}
      <VisitsToInvoice
        visits={visits}
        totalPence={visitsTotalPence}
        areMore={areMoreVisits}
        drafting={drafting}
        today={today}
        mayDraft={may.draft}
      />
    </Page>
  );
}
