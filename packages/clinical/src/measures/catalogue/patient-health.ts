import type { Band, Questionnaire, Source } from "../measure";

const manual: Source = { citation: "PHQ and GAD-7 instructions, from memory", standing: "memory" };
const credit = "Developed by Drs Spitzer, Williams, Kroenke and colleagues with a grant from Pfizer Inc.";

const phq9Bands: readonly Band[] = [
  { from: 0, to: 4, words: "minimal" },
  { from: 5, to: 9, words: "mild" },
  { from: 10, to: 14, words: "moderate" },
  { from: 15, to: 19, words: "moderately severe" },
  { from: 20, to: 27, words: "severe" },
];

export const phq9: Questionnaire = {
  form: "items",
  key: "phq-9",
  label: "Patient health questionnaire, 9 items",
  shortLabel: "PHQ-9",
  credit,
  scoring: {
    citation: "Sum 0 to 27; one or two blanks take the mean of the rest, more give no score",
    standing: "memory",
  },
  advice: ["Number each answer from 0 to 3.", "Look at item 9 yourself, whatever the total."],
  items: 9,
  answer: { min: 0, max: 3 },
  alarm: {
    item: 9,
    above: 0,
    words:
      "Item 9 is above 0. Ask about it before this visit ends, and follow your practice's policy for a person at risk.",
    ifBlank: "Item 9 was left blank. Ask about it before this visit ends.",
  },
  scales: [
    {
      key: "mood",
      label: "Low mood",
      unit: "points",
      min: 0,
      max: 27,
      decimals: 0,
      better: "lower",
      firstItem: 1,
      items: 9,
      missing: { kind: "at-least", answered: 7 },
      transform: { kind: "prorated-sum" },
      bands: phq9Bands,
      bandSource: { citation: "Kroenke and others 2001", standing: "read" },
      error: null,
      importance: [
        { amount: 5, of: "points", label: "5 points", population: "primary care", source: manual },
      ],
    },
  ],
};

export const phq2: Questionnaire = {
  form: "items",
  key: "phq-2",
  label: "Patient health questionnaire, first 2 items",
  shortLabel: "PHQ-2",
  credit,
  scoring: { citation: "Sum of both, 0 to 6 (PMC2906530)", standing: "read" },
  advice: [
    "Number each answer from 0 to 3. Both are needed.",
    "At 3 or more, go on to the 9 items. A cut of 2 misses fewer people and flags more who are well.",
  ],
  items: 2,
  answer: { min: 0, max: 3 },
  scales: [
    {
      key: "mood",
      label: "Low mood, first questions",
      unit: "points",
      min: 0,
      max: 6,
      decimals: 0,
      better: "lower",
      firstItem: 1,
      items: 2,
      missing: { kind: "all-needed" },
      transform: { kind: "sum" },
      bands: [
        { from: 0, to: 1, words: "negative" },
        { from: 2, to: 2, words: "negative at 3, positive at the more sensitive cut of 2" },
        { from: 3, to: 6, words: "positive: ask the 9 items" },
      ],
      bandSource: { citation: "PMC2906530", standing: "read" },
      error: null,
      importance: [],
    },
  ],
};

export const gad7: Questionnaire = {
  form: "items",
  key: "gad-7",
  label: "Generalised anxiety, 7 items",
  shortLabel: "GAD-7",
  credit,
  scoring: {
    citation: "Sum 0 to 21; one or two blanks take the mean of the rest, more give no score",
    standing: "memory",
  },
  advice: ["Number each answer from 0 to 3."],
  items: 7,
  answer: { min: 0, max: 3 },
  scales: [
    {
      key: "anxiety",
      label: "Anxiety",
      unit: "points",
      min: 0,
      max: 21,
      decimals: 0,
      better: "lower",
      firstItem: 1,
      items: 7,
      missing: { kind: "at-least", answered: 5 },
      transform: { kind: "prorated-sum" },
      bands: [
        { from: 0, to: 4, words: "minimal" },
        { from: 5, to: 9, words: "mild" },
        { from: 10, to: 14, words: "moderate" },
        { from: 15, to: 21, words: "severe" },
      ],
      bandSource: { citation: "Spitzer and others 2006", standing: "read" },
      error: null,
      importance: [
        { amount: 4, of: "points", label: "4 points", population: "primary care", source: manual },
      ],
    },
  ],
};
