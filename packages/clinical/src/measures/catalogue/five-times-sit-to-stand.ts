import type { PerformanceTest, Source } from "../measure";

export const fiveTimesNormSource: Source = { citation: "Bohannon 2006 (abstract)", standing: "read" };

/** More seconds than this is worse than average for the age band. */
export const fiveTimesNorms = [
  { from: 60, to: 69, seconds: 11.4 },
  { from: 70, to: 79, seconds: 12.6 },
  { from: 80, to: 89, seconds: 14.8 },
] as const;

/** More than this goes with repeated falls. */
export const fiveTimesFallCut = {
  seconds: 15,
  source: { citation: "Buatois and others 2008, as quoted", standing: "secondary" },
} as const;

export const fiveTimesSitToStand: PerformanceTest = {
  form: "reading",
  key: "five-times-sit-to-stand",
  label: "Five times sit to stand",
  shortLabel: "5 × STS",
  credit: "Bohannon 2006",
  scoring: { citation: "Seconds for five stands, arms crossed", standing: "read" },
  advice: [
    "Arms crossed. Time five full stands from the word go to the fifth stand.",
    "Stand close, and stop if the patient is dizzy.",
  ],
  reading: { label: "Seconds", min: 1, max: 180, isWhole: false },
  convert: "as-read",
  conditions: [],
  scale: {
    key: "time",
    label: "Time",
    unit: "seconds",
    min: 0,
    max: null,
    decimals: 1,
    better: "lower",
    error: null,
    importance: [],
  },
};
