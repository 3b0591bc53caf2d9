import type { Questionnaire } from "../measure";

const binkley = { citation: "Binkley and others 1999", standing: "read" } as const;

export const lowerExtremityFunctional: Questionnaire = {
  form: "items",
  key: "lower-extremity-functional",
  label: "Lower extremity functional scale",
  shortLabel: "LEFS",
  credit: "Binkley and others 1999",
  scoring: {
    citation:
      "Sum of 20 items, 0 to 80 (Binkley and others 1999). No rule for blanks was found, so all are needed",
    standing: "read",
  },
  advice: [
    "Number each answer from 0 to 4. All twenty are needed.",
    "The middle value in healthy adults is 77 (Acta Orthopaedica 2017).",
  ],
  items: 20,
  answer: { min: 0, max: 4 },
  scales: [
    {
      key: "function",
      label: "Leg function",
      unit: "points",
      min: 0,
      max: 80,
      decimals: 0,
      better: "higher",
      firstItem: 1,
      items: 20,
      missing: { kind: "all-needed" },
      transform: { kind: "sum" },
      error: { amount: 9, label: "MDC90", population: "leg problems", source: binkley },
      importance: [
        { amount: 9, of: "points", label: "9 points", population: "leg problems", source: binkley },
      ],
    },
  ],
};
