import { addDays, weekdayOf } from "@withy/core/zoned-time";
import { bankHolidayOn } from "@withy/diary/bank-holidays";
import { isWorkedOn } from "@withy/diary/working-pattern";
import { workingPatterns } from "../schema";
import type { House, PersonRow, SiteRow, Stage } from "./stage";

/** Minutes from midnight, both on the site's clock. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

export interface WorkingDay {
  readonly site: SiteRow;
  readonly stretches: readonly Stretch[];
}

export const minutesOf = (time: string): number => Number(time.slice(0, 2)) * 60 + Number(time.slice(3, 5));

export const clockOf = (minutes: number): string =>
  `${String(Math.floor(minutes / 60)).padStart(2, "0")}:${String(minutes % 60).padStart(2, "0")}`;

/** Tells when a person works on a day, from the patterns that were written; null on a free day or a bank holiday. */
export function makeWorkingDays(stage: Stage, house: House) {
  const patterns = stage.rows.of(workingPatterns).filter((row) => row.practiceId === house.practiceId);
  const sites = [...house.sites.values()];
  return (person: PersonRow, day: string): WorkingDay | null => {
    if (day !== stage.today && bankHolidayOn("england", day)) return null;
    const weekday = weekdayOf(day);
    const pattern = patterns.find(
      (row) =>
        row.staffMemberId === person.id &&
        isWorkedOn(
          { ...row, validUntil: row.validUntil ?? null, everyWeeks: row.everyWeeks ?? 1 },
          day,
          weekday,
        ),
    );
    const site = sites.find(({ id }) => id === pattern?.siteId);
    if (!pattern || !site) return null;
    const stretches: Stretch[] = [];
    let from = minutesOf(pattern.startsAt);
    for (const pause of pattern.breaks) {
      stretches.push({ from, to: minutesOf(pause.startsAt) });
      from = minutesOf(pause.endsAt);
    }
    return { site, stretches: [...stretches, { from, to: minutesOf(pattern.endsAt) }] };
  };
}

/** The last day at or before `day` on which the person works. */
export function workedOnOrBefore(
  workingDay: ReturnType<typeof makeWorkingDays>,
  person: PersonRow,
  day: string,
): string {
  for (let back = 0; back < 14; back += 1) {
    const candidate = addDays(day, -back);
    if (workingDay(person, candidate)) return candidate;
  }
  throw new RangeError(`${person.familyName} works on no day near ${day}.`);
}
