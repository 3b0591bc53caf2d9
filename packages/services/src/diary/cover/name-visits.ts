import type { CoverRefusalDetail } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { type AppError, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import type { Context } from "../../context";
import type { MoveRow } from "./cover-rows";
import { readPlanView } from "./cover-view";

const listed = (times: readonly string[]): string =>
  times.length < 2 ? (times[0] ?? "") : `${times.slice(0, -1).join("; ")} and ${times.at(-1)}`;

/**
 * A refusal that names the visits in the way: by their times in the sentence, by their patients in what comes with it.
 * @param sentence gets "the visit of Tue 1 Dec, 10:15" or "the visits of …"
 */
export async function refuseNaming(
  ctx: Context,
  kind: string,
  planId: string,
  moves: readonly MoveRow[],
  sentence: (which: string) => string,
): Promise<AppError> {
  const view = await readPlanView(ctx, planId);
  const named = view.moves.filter((m) => moves.some((move) => move.id === m.id));
  const visits: CoverRefusalDetail["visits"] = named.map((m) => ({
    appointmentId: m.appointmentId,
    patientName: m.patient.name,
    when: `${weekdayDate(m.before.day)}, ${m.before.startTime}`,
  }));
  const which = `the visit${visits.length === 1 ? "" : "s"} of ${listed(visits.map((v) => v.when))}`;
  return refused(refusal(kind, sentence(which)), { visits });
}
