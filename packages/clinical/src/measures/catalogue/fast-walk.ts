import type { PerformanceTest } from "../measure";

export const fastWalk: PerformanceTest = {
  form: "reading",
  key: "fast-walk-40m",
  label: "40 metre fast walk",
  shortLabel: "40 m walk",
  credit: "OARSI core set of performance tests, Dobson and others 2013",
  scoring: {
    citation: "Speed is 40 metres divided by the seconds walked (Dobson and others 2013, as summarised)",
    standing: "read",
  },
  advice: [
    "Ten metres marked out, walked four times, as fast as is safe without running. Leave the turns out of the time.",
    "Walk beside the patient. Stop if they are unsteady or in more pain than agreed.",
  ],
  reading: { label: "Seconds for 40 metres", min: 8, max: 600, isWhole: false },
  convert: "forty-metres",
  conditions: ["walking-aid"],
  scale: {
    key: "speed",
    label: "Speed",
    unit: "metres a second",
    min: 0,
    max: null,
    decimals: 2,
    better: "higher",
    error: null,
    importance: [
      {
        amount: 0.2,
        upTo: 0.3,
        of: "points",
        label: "0.2 to 0.3 m/s",
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
