import type { ActivityMeasure } from "../measure";

const form = { citation: "Stratford and others 1995, text of the form", standing: "read" } as const;

export const patientSpecificFunctional: ActivityMeasure = {
  form: "activities",
  key: "patient-specific-functional",
  label: "Patient-specific functional scale",
  shortLabel: "PSFS",
  credit: "Stratford and others 1995, reproduced with the permission of the authors",
  scoring: { citation: "Mean of the activities scored (Stratford and others 1995)", standing: "read" },
  advice: [
    "Ask for three things, up to five, that the problem makes hard, in the patient's own words.",
    "0 is cannot do it at all, 10 is as well as before the problem.",
    "Next time score the same activities, or the change cannot be read.",
  ],
  fewest: 3,
  most: 5,
  answer: { min: 0, max: 10 },
  scale: {
    key: "function",
    label: "Own activities",
    unit: "points",
    min: 0,
    max: 10,
    decimals: 1,
    better: "higher",
    error: { amount: 2, label: "MDC90 of the average", population: "musculoskeletal problems", source: form },
    importance: [],
  },
  oneActivityError: {
    amount: 3,
    label: "MDC90 of one activity",
    population: "musculoskeletal problems",
    source: form,
  },
};
