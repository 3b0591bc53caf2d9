import type { PerformanceTest } from "../measure";

/** Twelve seconds or more raises the flag: the end is included. */
export const timedUpAndGoFlag = {
  seconds: 12,
  source: { citation: "CDC STEADI, from memory", standing: "memory" },
} as const;

export const timedUpAndGo: PerformanceTest = {
  form: "reading",
  key: "timed-up-and-go",
  label: "Timed up and go",
  shortLabel: "TUG",
  credit: "Podsiadlo and Richardson 1991; CDC STEADI",
  scoring: { citation: "Rise, walk 3 m, turn, walk back, sit (HCPLive summary)", standing: "read" },
  advice: [
    "From the word go: rise, walk 3 metres at a usual pace, turn, walk back and sit. Usual shoes and aid.",
    "Walk beside the patient. Stop if they are unsteady.",
  ],
  reading: { label: "Seconds", min: 1, max: 300, isWhole: false },
  convert: "as-read",
  conditions: ["walking-aid"],
  scale: {
    key: "time",
    label: "Time",
    unit: "seconds",
    min: 0,
    max: null,
    decimals: 1,
    better: "lower",
    error: {
      amount: 1.14,
      sameRaterAmount: 1.1,
      label: "MDC",
      population: "knee osteoarthritis",
      source: { citation: "BMC Musculoskeletal Disorders 2015, s12891-015-0637-8", standing: "read" },
    },
    importance: [
      {
        amount: 0.8,
        upTo: 1.4,
        of: "points",
        label: "0.8 to 1.4 s",
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
