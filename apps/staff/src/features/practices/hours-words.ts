const weekdayNames = ["Mon", "Tue", "Wed", "Thu", "Fri", "Sat", "Sun"];

export interface DayHours {
  /** 1 Monday to 7 Sunday. */
  weekday: number;
  opensAt: string;
  closesAt: string;
}

/** "Mon to Fri 08:00 to 18:00, Sat 09:00 to 13:00": days in a row with the same hours are told once. */
export function hoursWords(hours: readonly DayHours[]): string {
  const runs: { first: number; last: number; words: string }[] = [];
  for (const { weekday, opensAt, closesAt } of hours.toSorted((a, b) => a.weekday - b.weekday)) {
    const words = `${opensAt} to ${closesAt}`;
    const run = runs.at(-1);
    if (run?.words === words && run.last === weekday - 1) run.last = weekday;
    else runs.push({ first: weekday, last: weekday, words });
  }
  const day = (weekday: number) => weekdayNames[weekday - 1] ?? "";
  return runs
    .map(
      ({ first, last, words }) => `${first === last ? day(first) : `${day(first)} to ${day(last)}`} ${words}`,
    )
    .join(", ");
}
