import type { Questionnaire } from "../measure";

/**
 * Raw sum 0 to 28 to interval score; 0 is extreme difficulty, 100 is none. One public copy misprints the value
 * for 11 as 67.7; the table must fall strictly, so it is 64.7.
 */
export const koosPsTable: readonly number[] = [
  100, 94.4, 89.5, 85.2, 81.4, 78.0, 75.1, 72.5, 70.3, 68.2, 66.4, 64.7, 63.0, 61.4, 59.7, 58.0, 56.0, 53.9,
  51.5, 48.8, 45.6, 42.1, 38.0, 33.4, 28.2, 22.3, 15.7, 8.2, 0,
];

const study = { citation: "PMC3943561", standing: "read" } as const;

export const koosPs: Questionnaire = {
  form: "items",
  key: "koos-ps",
  label: "KOOS physical function, short form",
  shortLabel: "KOOS-PS",
  credit: "KOOS-PS, Perruccio and others; koos.nu",
  scoring: {
    citation: "KOOS-PS User's Guide, koos.nu; table as quoted by a public score library",
    standing: "secondary",
  },
  advice: [
    "Number each answer from 0 (none) to 4 (extreme). All seven are needed.",
    "Shown as 0 extreme difficulty to 100 none. The guide also allows the other direction: always say which.",
  ],
  items: 7,
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
      items: 7,
      missing: { kind: "all-needed" },
      transform: { kind: "table", byRawSum: koosPsTable },
      error: null,
      importance: [
        { amount: 2.2, of: "points", label: "2.2", population: "knee osteoarthritis", source: study },
        {
          amount: 15,
          of: "points",
          label: "15.0 (moderate)",
          population: "knee osteoarthritis",
          source: study,
          isGuidanceOnly: true,
        },
      ],
    },
  ],
};
