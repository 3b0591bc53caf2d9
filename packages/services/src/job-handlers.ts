import { draftVisitsJob, draftVisitsKind } from "./billing/draft-visits-job";
import { coverJob } from "./diary/cover/cover-job";
import { coverKind } from "./diary/cover/cover-kind";
import type { JobHandler } from "./messaging/job-run";

/** Every kind of long work, by its name; the worker runs these. */
export const jobHandlers: Readonly<Record<string, JobHandler>> = {
  [coverKind]: coverJob,
  [draftVisitsKind]: draftVisitsJob,
};
