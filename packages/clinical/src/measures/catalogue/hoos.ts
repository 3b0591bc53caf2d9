import type { ItemScale, Questionnaire } from "../measure";

const error = { citation: "BMC Musculoskeletal Disorders 2014, 15:235", standing: "read" } as const;
const importance: ItemScale["importance"] = [
  {
    amount: 6,
    upTo: 10,
    of: "points",
    label: "6 to 10",
    population: "hip osteoarthritis after 12 weeks of exercise",
    source: { citation: "University of Southern Denmark research portal", standing: "read" },
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
    error: mdc === null ? null : { amount: mdc, label: "MDC95", population: "hip", source: error },
    importance,
  };
}

/** Five subscales and no total: the authors ask that they be shown side by side. */
export const hoos: Questionnaire = {
  form: "items",
  key: "hoos",
  label: "Hip disability and osteoarthritis outcome score",
  shortLabel: "HOOS",
  credit: "HOOS, Nilsdotter, Roos and others; koos.nu",
  scoring: {
    citation:
      "HOOS scoring: 100 minus the mean's share of 4; at least half of a subscale answered (5, 3, 9, 2, 2)",
    standing: "read",
  },
  advice: [
    "Number each answer from 0 (first box) to 4 (last box).",
    "A mark outside a box counts as the nearest box. Where two are marked, take the worse one.",
  ],
  items: 40,
  answer: { min: 0, max: 4 },
  scales: [
    subscale("symptoms", "Symptoms", 1, 5, 3, 22.7),
    subscale("pain", "Pain", 6, 10, 5, 21.6),
    subscale("daily-living", "Daily living", 16, 17, 9, 17.7),
    subscale("sport", "Sport and recreation", 33, 4, 2, null),
    subscale("quality-of-life", "Quality of life", 37, 4, 2, 24.4),
  ],
};
