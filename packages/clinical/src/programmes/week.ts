import type { TrainingKind } from "../exercises/exercise";
import { findExercise } from "../exercises/library";
import { compareWithGuidance, type GuidanceLine } from "./activity-guidance";
import { itemSetTime, sessionTime, timesInARound, weekSeconds } from "./compute-time";
import type { Programme, ProgrammeItem } from "./programme";

export interface ProgrammeWeek {
  readonly sessionsPerWeek: number;
  readonly sessionSeconds: number;
  readonly weekSeconds: number;
  readonly underTensionWeekSeconds: number;
  readonly guidance: readonly GuidanceLine[];
}

const trains = (item: ProgrammeItem, kind: TrainingKind) =>
  findExercise(item.exercise)?.kinds.includes(kind) === true;

function workOf(programme: Programme, item: ProgrammeItem): number {
  return programme.mode === "timed"
    ? item.workSeconds * timesInARound(item) * programme.rounds
    : itemSetTime(item).underTensionSeconds;
}

/**
 * Totals of a week and the guidance beside them. Only work in aerobic exercises counts as moderate minutes; a
 * session counts as a strength or balance day if one of its items trains that. A day holds one session here, so
 * more than seven sessions still make seven days.
 */
export function programmeWeek(programme: Programme, age: number | null): ProgrammeWeek {
  const time = sessionTime(programme);
  const sessions = programme.sessionsPerWeek;
  const aerobic = programme.items.filter((item) => trains(item, "aerobic"));
  const aerobicSeconds = aerobic.reduce((sum, item) => sum + workOf(programme, item), 0);
  const daysOf = (kind: TrainingKind) =>
    programme.items.some((i) => trains(i, kind)) ? Math.min(7, sessions) : 0;
  return {
    sessionsPerWeek: sessions,
    sessionSeconds: time.elapsedSeconds,
    weekSeconds: weekSeconds(time.elapsedSeconds, sessions),
    underTensionWeekSeconds: weekSeconds(time.underTensionSeconds, sessions),
    guidance: compareWithGuidance({
      moderateMinutes: (aerobicSeconds * sessions) / 60,
      vigorousMinutes: 0,
      strengthDays: daysOf("strength"),
      balanceDays: daysOf("balance"),
      age,
    }),
  };
}
