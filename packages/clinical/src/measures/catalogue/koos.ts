import type { ItemScale, Questionnaire } from "../measure";

const error = { citation: "BMC Musculoskeletal Disorders 2014, 15:235", standing: "read" } as const;
const importance: ItemScale["importance"] = [
  {
    amount: 8,
    upTo: 10,
    of: "points",
    label: "8 to 10",
    population: "knee",
    source: { citation: "Often used; Roos, from memory", standing: "memory" },
    isGuidanceOnly: true,
  },
];

function subscale(
  key: string,
  label: string,
  firstItem: number,
  items: number,
  atLeast: number,
  mdc: number | null,
): ItemScale {
  return {
    key,
    label,
    unit: "points",
    min: 0,
    max: 100,
    decimals: 1,
    better: "higher",
    firstItem,
    items,
    missing: { kind: "at-least", answered: atLeast },
    transform: { kind: "reversed-hundred", highest: 4 },
    error: mdc === null ? null : { amount: mdc, label: "MDC95", population: "knee", source: error },
    importance,
  };
}

/** Five subscales and no total: the authors ask that they be shown side by side. */
export const koos: Questionnaire = {
  form: "items",
  key: "koos",
  label: "Knee injury and osteoarthritis outcome score",
  shortLabel: "KOOS",
  credit: "KOOS, Roos and others; koos.nu",
  scoring: {
    citation:
      "KOOS scoring: 100 minus the mean's share of 4; at least half of a subscale answered (4, 5, 9, 3, 2)",
    standing: "read",
  },
  advice: [
    "Number each answer from 0 (first box) to 4 (last box).",
    "A mark outside a box counts as the nearest box. Where two are marked, take the worse one.",
  ],
  items: 42,
  answer: { min: 0, max: 4 },
  scales: [
    subscale("symptoms", "Symptoms", 1, 7, 4, 24.1),
    subscale("pain", "Pain", 8, 9, 5, 20.2),
    subscale("daily-living", "Daily living", 17, 17, 9, 20.8),
    subscale("sport", "Sport and recreation", 34, 5, 3, null),
    subscale("quality-of-life", "Quality of life", 39, 4, 2, 26.6),
  ],
};
