import { type DraftingJobView, type DraftingResult, draftInvoicesInput } from "@withy/contracts/billing";
import { z } from "zod";
import { actForRequester } from "../messaging/act-for-requester";
import type { JobHandler, JobRow } from "../messaging/job-run";
import { jobView } from "../messaging/job-view";
import { draftVisits } from "./draft-visits";
import { hasPrice, visitsToInvoice } from "./visits-to-invoice";

export const draftVisitsKind = "billing.draft-visits";

const storedResult = z.object({
  drafts: z.int(),
  visitsDrafted: z.int(),
  visitsWithoutPrice: z.int(),
}) satisfies z.ZodType<DraftingResult>;

const nothing: DraftingResult = { drafts: 0, visitsDrafted: 0, visitsWithoutPrice: 0 };

export const draftingView = (row: JobRow): DraftingJobView => jobView(row, (r) => storedResult.parse(r));

/**
 * Drafts every visit that waits within the person's reach. Progress and result are written with the drafts, so that
 * a run after a kill goes on from what stands: it finds only the visits that are left.
 */
export const draftVisitsJob: JobHandler = async (system, run) => {
  const ctx = await actForRequester(system, run.row, "billing.draft");
  const visits = await visitsToInvoice(ctx, draftInvoicesInput.parse(run.row.input), null);
  const priced = visits.filter(hasPrice);
  const earlier = run.row.result === null ? nothing : storedResult.parse(run.row.result);
  const total = Math.max(run.row.progressTotal, priced.length);
  const doneBefore = total - priced.length;
  const resultOf = (drafts: number, visitsDrafted: number) => ({
    drafts: earlier.drafts + drafts,
    visitsDrafted: earlier.visitsDrafted + visitsDrafted,
    visitsWithoutPrice: visits.length - priced.length,
  });
  await run.progress(doneBefore, total, { result: resultOf(0, 0) });
  await draftVisits(ctx, priced, {
    between: run.pauseIfAsked,
    written: (within, { invoiceIds, visitsDrafted, visitsSeen }) =>
      run.progress(doneBefore + visitsSeen, total, {
        result: resultOf(invoiceIds.length, visitsDrafted),
        within,
      }),
  });
  await run.progress(total, total);
};
