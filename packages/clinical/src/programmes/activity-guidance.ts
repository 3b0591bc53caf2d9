export interface WeekOfActivity {
  readonly moderateMinutes: number;
  readonly vigorousMinutes: number;
  /** Days a week with strengthening work. */
  readonly strengthDays: number;
  readonly balanceDays: number;
  /** Whole years; null where it is not known. */
  readonly age: number | null;
}

export interface GuidanceLine {
  readonly aim: "aerobic" | "strength" | "balance";
  readonly asks: string;
  readonly does: string;
  readonly isMet: boolean;
  readonly source: string;
}

const ukCmo = "UK Chief Medical Officers' guidelines 2019";
const who = "World Health Organization guidelines 2020";

/** One minute of vigorous activity counts as two of moderate (from 150 or 75 minutes a week). */
export function moderateEquivalent(
  week: Pick<WeekOfActivity, "moderateMinutes" | "vigorousMinutes">,
): number {
  return week.moderateMinutes + 2 * week.vigorousMinutes;
}

const days = (n: number) => (n === 1 ? "1 day a week" : `${n} days a week`);
const minutes = (n: number) => `${Math.floor(n)} min a week`;

/**
 * A week set beside published guidance. Shown as information: this programme is only a part of the week.
 * Sources: UK CMO 2019 (150 min moderate or 75 vigorous or a mix; strength on 2 days; older adults balance on
 * 2 days); WHO 2020 (the same minutes; from 65, balance and strength on 3 days: from memory).
 */
export function compareWithGuidance(week: WeekOfActivity): GuidanceLine[] {
  const equivalent = moderateEquivalent(week);
  const lines: GuidanceLine[] = [
    {
      aim: "aerobic",
      asks: "150 min moderate, or 75 vigorous, a week",
      does: minutes(equivalent),
      isMet: equivalent >= 150,
      source: ukCmo,
    },
    {
      aim: "strength",
      asks: "strength on 2 days or more",
      does: days(week.strengthDays),
      isMet: week.strengthDays >= 2,
      source: ukCmo,
    },
  ];
  if (week.age === null || week.age < 65) return lines;
  return [
    ...lines,
    {
      aim: "balance",
      asks: "balance on 2 days or more",
      does: days(week.balanceDays),
      isMet: week.balanceDays >= 2,
      source: ukCmo,
    },
    {
      aim: "balance",
      asks: "balance and strength on 3 days or more",
      does: days(Math.min(week.balanceDays, week.strengthDays)),
      isMet: Math.min(week.balanceDays, week.strengthDays) >= 3,
      source: who,
    },
  ];
}
