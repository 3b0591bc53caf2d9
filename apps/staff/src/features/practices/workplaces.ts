import type { PatternSettings } from "@withy/contracts/practices";
import { hoursWords } from "./hours-words";

/** Where someone works, when, and with which breaks, in words. */
export interface Workplace {
  id: string;
  therapistName: string;
  siteName: string;
  hours: string;
  breaks: string;
}

/** One line for each person, site and rhythm of weeks, instead of one for each weekday. */
export function workplaces(patterns: readonly PatternSettings[]): Workplace[] {
  const groups = new Map<string, PatternSettings[]>();
  for (const pattern of patterns) {
    const id = [pattern.therapistName, pattern.siteName, pattern.everyWeeks].join("|");
    groups.set(id, [...(groups.get(id) ?? []), pattern]);
  }
  return [...groups].flatMap(([id, group]) => {
    const [first] = group;
    if (!first) return [];
    const hours = hoursWords(
      group.map(({ weekday, startsAt, endsAt }) => ({ weekday, opensAt: startsAt, closesAt: endsAt })),
    );
    const breaks = group.flatMap((pattern) =>
      pattern.breaks.map((b) => `${b.label} ${b.startsAt} to ${b.endsAt}`),
    );
    return [
      {
        id,
        therapistName: first.therapistName,
        siteName: first.siteName,
        hours: first.everyWeeks > 1 ? `${hours}, every ${first.everyWeeks} weeks` : hours,
        breaks: [...new Set(breaks)].join(", "),
      },
    ];
  });
}
