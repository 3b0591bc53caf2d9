import { compareValues } from "@withy/clinical/measures/change";
import type { Answer } from "@withy/clinical/measures/entry";
import type { ItemScale, Questionnaire, Scale } from "@withy/clinical/measures/measure";
import { formatScore } from "@withy/clinical/measures/rounding";
import { scoreScale } from "@withy/clinical/measures/score";

/** A blank. */
export const N = null;
export const repeat = (answer: Answer, times: number): Answer[] =>
  Array.from({ length: times }, () => answer);

export function scale(measure: Questionnaire, key: string): ItemScale {
  const found = measure.scales.find((s) => s.key === key);
  if (!found) throw new Error(`no scale ${key}`);
  return found;
}

/** The value as it is shown, or "no score". */
export function shown(measure: Questionnaire, key: string, answers: readonly Answer[]): string {
  const target = scale(measure, key);
  const score = scoreScale(target, answers);
  return score.value === null ? "no score" : formatScore(score.value, target.decimals);
}

export function change(of: Scale, first: number, latest: number) {
  const result = compareValues(of, { value: first, comparedBy: null }, { value: latest, comparedBy: null });
  if (result.kind !== "compared") throw new Error("not compared");
  return result;
}

export const met = (of: Scale, first: number, latest: number, label: string) =>
  change(of, first, latest).importance.find((rule) => rule.label === label)?.met;
