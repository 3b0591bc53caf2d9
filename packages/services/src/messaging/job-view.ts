import type { JobStateCode, JobView } from "@withy/contracts/jobs";
import type { JobRow } from "./job-run";

const states: Record<JobRow["state"], JobStateCode> = {
  waiting: "waiting",
  claimed: "running",
  done: "done",
  failed: "failed",
};

/** @param readResult the kind's own result out of what is stored */
export function jobView<R>(row: JobRow, readResult: (stored: Record<string, unknown>) => R): JobView<R> {
  return {
    id: row.id,
    state: states[row.state],
    progressDone: row.progressDone,
    progressTotal: row.progressTotal,
    result: row.result === null ? null : readResult(row.result),
    problem: row.state === "failed" ? row.problem : null,
  };
}
