import type { PerformanceTest } from "../measure";

export const stairClimb: PerformanceTest = {
  form: "reading",
  key: "stair-climb",
  label: "Stair climb, up and down",
  shortLabel: "Stairs",
  credit: "OARSI core set of performance tests, Dobson and others 2013",
  scoring: {
    citation:
      "Seconds up and down; nine steps of 20 cm preferred, else the number is recorded (HCPLive summary)",
    standing: "read",
  },
  advice: [
    "Nine steps of 20 cm if you have them. Otherwise enter how many, and use the same stairs next time.",
    "The rail may be used. Stand below the patient on the way up and the way down.",
  ],
  reading: { label: "Seconds up and down", min: 2, max: 600, isWhole: false },
  convert: "as-read",
  conditions: ["steps"],
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
