import type { Questionnaire } from "../measure";

/** Raw sum 0 to 20 to interval score; 0 is extreme difficulty, 100 is none. */
export const hoosPsTable: readonly number[] = [
  100, 95.4, 91.2, 87.3, 83.6, 80.0, 76.6, 73.1, 69.6, 66.1, 62.3, 58.3, 53.9, 49.2, 44.1, 38.4, 32.1, 25.2,
  17.6, 9.2, 0,
];

export const hoosPs: Questionnaire = {
  form: "items",
  key: "hoos-ps",
  label: "HOOS physical function, short form",
  shortLabel: "HOOS-PS",
  credit: "HOOS-PS, Davis and others; koos.nu",
  scoring: {
    citation: "HOOS-PS User's Guide, koos.nu; table as quoted by a public score library",
    standing: "secondary",
  },
  advice: [
    "Number each answer from 0 (none) to 4 (extreme). All five are needed.",
    "Shown as 0 extreme difficulty to 100 none. The guide also allows the other direction: always say which.",
  ],
  items: 5,
  answer: { min: 0, max: 4 },
  scales: [
    {
      key: "function",
      label: "Physical function",
      unit: "points",
      min: 0,
      max: 100,
      decimals: 1,
      better: "higher",
      firstItem: 1,
      items: 5,
      missing: { kind: "all-needed" },
      transform: { kind: "table", byRawSum: hoosPsTable },
      error: null,
      importance: [],
    },
  ],
};
