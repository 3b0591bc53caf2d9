import type { Questionnaire } from "../measure";

const consensus = {
  citation: "Ostelo and others 2008, consensus on important change (abstract)",
  standing: "read",
} as const;

export const rolandMorris: Questionnaire = {
  form: "items",
  key: "roland-morris",
  label: "Roland-Morris disability questionnaire, 24 items",
  shortLabel: "RMDQ",
  credit: "Roland and Morris 1983; rmdq.org",
  scoring: {
    citation: "Count of the items ticked; an item left blank or not applicable counts as not ticked",
    standing: "read",
  },
  advice: [
    "Enter 1 for each item ticked.",
    "Under 4 there is little room to show getting better, over 20 little room to show getting worse.",
  ],
  items: 24,
  answer: { min: 0, max: 1 },
  scales: [
    {
      key: "disability",
      label: "Back disability",
      unit: "ticks",
      min: 0,
      max: 24,
      decimals: 0,
      better: "lower",
      firstItem: 1,
      items: 24,
      missing: { kind: "blank-is-zero" },
      transform: { kind: "sum" },
      error: null,
      importance: [
        { amount: 5, of: "points", label: "5 points", population: "back pain", source: consensus },
        { amount: 30, of: "percent", label: "30%", population: "back pain", source: consensus },
      ],
    },
  ],
};
