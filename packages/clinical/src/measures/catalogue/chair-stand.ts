import type { PerformanceTest, Source } from "../measure";

export const chairStandSource: Source = {
  citation: "CDC STEADI, 30-second chair stand, as quoted by three agreeing pages",
  standing: "secondary",
};

interface NormRow {
  readonly from: number;
  readonly to: number;
  readonly male: number;
  readonly female: number;
}

/** Fewer stands than this is below average for the age band, in whole years. */
export const chairStandNorms: readonly NormRow[] = [
  { from: 60, to: 64, male: 14, female: 12 },
  { from: 65, to: 69, male: 12, female: 11 },
  { from: 70, to: 74, male: 12, female: 10 },
  { from: 75, to: 79, male: 11, female: 10 },
  { from: 80, to: 84, male: 10, female: 9 },
  { from: 85, to: 89, male: 8, female: 8 },
  { from: 90, to: 94, male: 7, female: 4 },
];

export const chairStand: PerformanceTest = {
  form: "reading",
  key: "chair-stand-30",
  label: "30-second chair stand",
  shortLabel: "Chair stand",
  credit: "CDC STEADI (United States public domain)",
  scoring: chairStandSource,
  advice: [
    "Straight chair against a wall, arms crossed. Count full stands in 30 seconds.",
    "More than half-way up when the time ends counts as one. If the arms push, the result is 0.",
    "Stand close, and stop if the patient is dizzy, breathless or in more pain than agreed.",
  ],
  reading: { label: "Full stands in 30 seconds", min: 0, max: 60, isWhole: true },
  convert: "chair-stands",
  conditions: ["used-arms"],
  scale: {
    key: "stands",
    label: "Stands",
    unit: "stands",
    min: 0,
    max: null,
    decimals: 0,
    better: "higher",
    error: null,
    importance: [
      {
        amount: 2,
        upTo: 2.6,
        of: "points",
        label: "2.0 to 2.6 stands",
        population: "hip osteoarthritis, major improvement",
        source: {
          citation: "Wright and others 2011, from memory; a later trial of 160 people could not confirm it",
          standing: "memory",
        },
        isGuidanceOnly: true,
      },
    ],
  },
};
