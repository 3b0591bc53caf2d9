import type { Questionnaire } from "../measure";

const consensus = {
  citation: "Ostelo and others 2008, consensus on important change (abstract)",
  standing: "read",
} as const;
const salaffi = {
  citation: "Salaffi and others 2004, chronic musculoskeletal pain",
  standing: "read",
} as const;

export const painRating: Questionnaire = {
  form: "items",
  key: "pain-rating",
  label: "Pain rating, 0 to 10",
  shortLabel: "Pain",
  credit: "A generic single question with no owner",
  scoring: { citation: "A single whole number from 0 to 10", standing: "common practice" },
  advice: [
    "Say which pain and when, and ask the same each time: for example walking, this week.",
    "0 is no pain, 10 is as bad as it can be imagined.",
  ],
  items: 1,
  answer: { min: 0, max: 10 },
  ownWording: ["How strong is the pain, from 0 (none) to 10 (as bad as you can imagine)?"],
  scales: [
    {
      key: "pain",
      label: "Pain",
      unit: "points",
      min: 0,
      max: 10,
      decimals: 0,
      better: "lower",
      firstItem: 1,
      items: 1,
      missing: { kind: "all-needed" },
      transform: { kind: "sum" },
      error: {
        amount: 1.77,
        label: "smallest detectable change",
        population: "back pain",
        source: { citation: "Thieme eJournals a-1304-3677", standing: "read" },
      },
      importance: [
        { amount: 2, of: "points", label: "2 points", population: "back pain", source: consensus },
        { amount: 30, of: "percent", label: "30%", population: "back pain", source: consensus },
        {
          amount: 1,
          of: "points",
          label: "1 point",
          population: "chronic musculoskeletal pain",
          source: salaffi,
          isGuidanceOnly: true,
        },
        {
          amount: 15,
          of: "percent",
          label: "15%",
          population: "chronic musculoskeletal pain",
          source: salaffi,
          isGuidanceOnly: true,
        },
        {
          amount: 33,
          of: "percent",
          label: "33% (much better)",
          population: "chronic musculoskeletal pain",
          source: salaffi,
          isGuidanceOnly: true,
        },
      ],
    },
  ],
};
