import { z } from "zod";
import { idField } from "./fields";

export const jobIdInput = z.strictObject({ jobId: idField });

export type JobStateCode = "waiting" | "running" | "done" | "failed";

/** Long work as the person who waits for it sees it. */
export interface JobView<R> {
  readonly id: string;
  readonly state: JobStateCode;
  readonly progressDone: number;
  /** 0 until the work has been measured. */
  readonly progressTotal: number;
  /** What has come of it so far. */
  readonly result: R | null;
  /** Why it failed and what to do; only once it has failed. */
  readonly problem: string | null;
}
