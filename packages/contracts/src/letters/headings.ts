/** The parts of a letter, in the order in which they are read: what is wrong and who must do what come first. */
export const letterSectionKeys = [
  "diagnoses",
  "plan",
  "referrer",
  "attendance",
  "history",
  "concerns",
  "findings",
  "scales",
  "summary",
  "advice",
  "safety",
  "allergies",
] as const;
export type LetterSectionKey = (typeof letterSectionKeys)[number];

/** Headings of the outpatient letter standard of the Professional Record Standards Body (v2.2; names from memory). */
export const letterHeadings: Record<LetterSectionKey, string> = {
  diagnoses: "Diagnoses",
  plan: "Plan and requested actions",
  referrer: "Referrer details",
  attendance: "Attendance details",
  history: "Relevant history",
  concerns: "Patient and carer concerns, expectations and wishes",
  findings: "Examination findings",
  scales: "Assessment scales",
  summary: "Clinical summary",
  advice: "Information and advice given",
  safety: "Safety alerts",
  allergies: "Allergies and adverse reactions",
};

/** Who an action in the plan is for. */
export const letterActors = ["gp", "patient", "practice"] as const;
export type LetterActor = (typeof letterActors)[number];
