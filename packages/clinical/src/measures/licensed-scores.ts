import type { Answer } from "./entry";
import { type ScaleScore, scoreScale } from "./score";

/**
 * Checks a QuickDASH total from its eleven numbers (1 to 5): (mean minus 1) times 25, at most one blank.
 * Source: Institute for Work & Health, DASH scoring sheet.
 */
export function scoreQuickDash(answers: readonly Answer[]): ScaleScore {
  return scoreScale(
    {
      key: "total",
      items: 11,
      missing: { kind: "at-least", answered: 10 },
      transform: { kind: "hundred", lowest: 1, highest: 5 },
    },
    answers,
  );
}

/**
 * Neck disability as a share of what was answered, 0 to 100: sum times 100 over 5 times the items answered (from memory).
 * Null where nothing was answered.
 */
export function neckDisabilityPercent(answers: readonly Answer[]): number | null {
  const answered = answers.filter((a): a is number => a !== null);
  if (answered.length === 0) return null;
  return (answered.reduce((sum, a) => sum + a, 0) * 100) / (5 * answered.length);
}

export interface StartBackAnswers {
  /** Items 1 to 8: agreed or not. */
  readonly agreed: readonly boolean[];
  /** Item 9: counts where it was "very much" or "extremely". */
  readonly isVeryBothersome: boolean;
}

export interface StartBackResult {
  readonly total: number;
  /** Items 5 to 9. */
  readonly subscore: number;
  readonly group: "low" | "medium" | "high";
  /** SNOMED CT concept of the group. */
  readonly code: string;
}

const startBackCodes = { low: "945621000000107", medium: "45641000000100", high: "45601000000103" } as const;

/** Groups a STarT Back result: total 3 or less low; else sub-score 3 or less medium, 4 or more high. Source: Keele University, online calculator. */
export function groupStartBack({ agreed, isVeryBothersome }: StartBackAnswers): StartBackResult {
  const last = isVeryBothersome ? 1 : 0;
  const total = agreed.slice(0, 8).filter(Boolean).length + last;
  const subscore = agreed.slice(4, 8).filter(Boolean).length + last;
  const group = total <= 3 ? "low" : subscore <= 3 ? "medium" : "high";
  return { total, subscore, group, code: startBackCodes[group] };
}
