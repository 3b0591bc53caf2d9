import { useQueryClient } from "@tanstack/react-query";
import type { DraftView } from "@withy/contracts/billing";
import { formatMoney, sumPence } from "@withy/core/money";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { issueInvoice } from "../api-client";
import { billingKeys } from "../query-keys";
import { timeNow } from "../time-now";

export interface IssueProblem {
  readonly draftId: string;
  readonly message: string;
}

/** Issues drafts one after the other, so that each gets its number or its reason; one that fails stops no other. */
export function useIssueMany() {
  const client = useQueryClient();
  const { announce } = useChanges();
  const [done, setDone] = useState<{ count: number; of: number } | null>(null);
  const [problems, setProblems] = useState<readonly IssueProblem[]>([]);

  const run = async (drafts: readonly DraftView[]) => {
    setProblems([]);
    const issued: DraftView[] = [];
    const failed: IssueProblem[] = [];
    for (const draft of drafts) {
      setDone({ count: issued.length + failed.length, of: drafts.length });
      try {
        await issueInvoice({ invoiceId: draft.id, version: draft.version }, crypto.randomUUID());
        issued.push(draft);
      } catch (error) {
        failed.push({ draftId: draft.id, message: problemItems(error)[0]?.message ?? "" });
      }
    }
    setDone(null);
    setProblems(failed);
    if (issued.length > 0) {
      const sum = formatMoney(sumPence(issued.map((d) => d.totalPence)));
      announce({
        at: timeNow(),
        said: `${issued.length} ${issued.length === 1 ? "invoice" : "invoices"} issued, ${sum}`,
      });
    }
    await client.invalidateQueries({ queryKey: billingKeys.all });
  };
  return { run, done, problems };
}
