import type { Better, ErrorThreshold, ImportanceThreshold, LicensedTotal, Source } from "../measure";

interface Row {
  key: string;
  label: string;
  shortLabel: string;
  credit: string;
  min: number;
  max: number;
  decimals: 0 | 1 | 2;
  better: Better;
  licence: string;
  scoring: Source;
  error?: ErrorThreshold;
  importance?: readonly ImportanceThreshold[];
}

function licensed(row: Row): LicensedTotal {
  const { min, max, decimals, better, error, importance, ...about } = row;
  return {
    ...about,
    form: "total",
    advice: [`Work from your own licensed form and type the total, ${min} to ${max}.`],
    scale: {
      key: "total",
      label: "Total",
      unit: "points",
      min,
      max,
      decimals,
      better,
      error: error ?? null,
      importance: importance ?? [],
    },
  };
}

const memory = (citation: string): Source => ({ citation: `${citation}, from memory`, standing: "memory" });

export const quickDash = licensed({
  key: "quickdash",
  label: "QuickDASH",
  shortLabel: "QuickDASH",
  credit: "Institute for Work & Health",
  min: 0,
  max: 100,
  decimals: 1,
  better: "lower",
  licence: "Institute for Work & Health: commercial use by agreement",
  scoring: { citation: "Institute for Work & Health, DASH scoring sheet", standing: "read" },
  importance: [
    {
      amount: 14,
      of: "points",
      label: "14 points",
      population: "arm problems (range 9 to 20)",
      source: { citation: "Gummesson and others 2006, as quoted", standing: "secondary" },
    },
  ],
});

export const neckDisability = licensed({
  key: "neck-disability",
  label: "Neck disability index",
  shortLabel: "NDI",
  credit: "Vernon; licensed through Mapi Research Trust",
  min: 0,
  max: 50,
  decimals: 0,
  better: "lower",
  licence: "Mapi Research Trust",
  scoring: memory("Sum of ten items"),
  error: {
    amount: 4.7,
    label: "MDC90",
    population: "neck pain",
    source: { citation: "Stratford and others 1999, as quoted", standing: "secondary" },
  },
});

export const startBack = licensed({
  key: "start-back",
  label: "STarT Back",
  shortLabel: "STarT Back",
  credit: "Keele University",
  min: 0,
  max: 9,
  decimals: 0,
  better: "lower",
  licence: "Keele University: agree before it is built into anything sold",
  scoring: { citation: "Keele University, online calculator", standing: "read" },
});

export const oxfordHip = licensed({
  key: "oxford-hip",
  label: "Oxford hip score",
  shortLabel: "Oxford hip",
  credit: "Oxford University Innovation",
  min: 0,
  max: 48,
  decimals: 0,
  better: "higher",
  licence: "Oxford University Innovation",
  scoring: memory("Sum of twelve items, 0 to 48"),
});

export const oxfordKnee = licensed({
  key: "oxford-knee",
  label: "Oxford knee score",
  shortLabel: "Oxford knee",
  credit: "Oxford University Innovation",
  min: 0,
  max: 48,
  decimals: 0,
  better: "higher",
  licence: "Oxford University Innovation",
  scoring: memory("Sum of twelve items, 0 to 48"),
});

export const mskHq = licensed({
  key: "msk-hq",
  label: "Musculoskeletal health questionnaire",
  shortLabel: "MSK-HQ",
  credit: "Oxford University Innovation",
  min: 0,
  max: 56,
  decimals: 0,
  better: "higher",
  licence: "Oxford University Innovation",
  scoring: memory("Sum of fourteen items, 0 to 56"),
});
