/** Grades as they are said at the couch, weakest first. */
export const strengthGrades = ["0", "1", "2", "3", "3+", "4-", "4", "4+", "5-", "5"] as const;
export type StrengthGrade = (typeof strengthGrades)[number];

export const strengthCredit = "Used with the permission of the Medical Research Council";

/** What each whole grade means. Source: Medical Research Council, Memorandum 45, as quoted; our wording. */
export const gradeMeanings: Readonly<Record<"0" | "1" | "2" | "3" | "4" | "5", string>> = {
  "0": "No contraction",
  "1": "A flicker, no movement",
  "2": "Moves with gravity taken away",
  "3": "Moves against gravity",
  "4": "Moves against gravity and some resistance",
  "5": "Full strength",
};

const sumValues: Record<StrengthGrade, number> = {
  "0": 0,
  "1": 1,
  "2": 2,
  "3": 3,
  "3+": 3,
  "4-": 3,
  "4": 4,
  "4+": 4,
  "5-": 4,
  "5": 5,
};

/** Reads "4+", "4 +", "4/5" or "4-"; null where it is no grade. */
export function readStrengthGrade(text: string): StrengthGrade | null {
  const bare = text.replace(/\s+/g, "").replace(/\/5$/, "").replace("−", "-");
  return strengthGrades.find((grade) => grade === bare) ?? null;
}

/** The whole number that a grade counts for in a sum: 4+ as 4, 4- as 3, 5- as 4. Source: MRC sum-score sheet, as quoted. */
export function sumValueOf(grade: StrengthGrade): number {
  return sumValues[grade];
}

/** The sum of grades; for two sides of several muscle groups. */
export function strengthSum(grades: readonly StrengthGrade[]): number {
  return grades.reduce((sum, grade) => sum + sumValues[grade], 0);
}
