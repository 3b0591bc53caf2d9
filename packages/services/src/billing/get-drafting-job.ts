import type { DraftingJobView } from "@withy/contracts/billing";
import { jobIdInput } from "@withy/contracts/jobs";
import { loadJob } from "../messaging/start-job";
import { verb } from "../verb";
import { draftingView, draftVisitsKind } from "./draft-visits-job";

/** How far a drafting is: counts only, for everyone of the practice who may draft. */
export const getDraftingJob = verb(
  "billing.draft",
  jobIdInput,
  async (ctx, { jobId }): Promise<DraftingJobView> =>
    draftingView(await loadJob(ctx, draftVisitsKind, jobId)),
);
