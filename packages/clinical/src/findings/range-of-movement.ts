import { type Refusal, refusal } from "@withy/core/refusal";
import type { Source } from "../measures/measure";

const sources = {
  aaos: {
    citation: "American Academy of Orthopaedic Surgeons 1965, via Norkin and White, from memory",
    standing: "memory",
  },
  ama: { citation: "AMA Guides, from memory", standing: "memory" },
  msd: { citation: "MSD Manual, table of normal joint movement", standing: "read" },
} as const satisfies Record<string, Source>;

export type ReferenceKey = keyof typeof sources;
export const referenceSources: Readonly<Record<ReferenceKey, Source>> = sources;

export interface Movement {
  readonly key: string;
  readonly joint: string;
  readonly label: string;
  /** Degrees beyond which a figure is a slip of the hand, not a finding. */
  readonly bounds: readonly [number, number];
  /** Degrees by source. A source that does not give this movement is absent. */
  readonly reference: Readonly<Partial<Record<ReferenceKey, number>>>;
}

type Row = readonly [
  key: string,
  joint: string,
  label: string,
  min: number,
  max: number,
  reference: Movement["reference"],
];

const rows: readonly Row[] = [
  ["hip-flexion", "hip", "Hip flexion", -10, 160, { aaos: 120, ama: 100, msd: 125 }],
  ["hip-extension", "hip", "Hip extension", -40, 50, { aaos: 30, ama: 30, msd: 15 }],
  ["hip-abduction", "hip", "Hip abduction", -10, 90, { aaos: 45, ama: 40, msd: 45 }],
  ["hip-adduction", "hip", "Hip adduction", -10, 60, { aaos: 30, ama: 20, msd: 45 }],
  ["hip-internal-rotation", "hip", "Hip internal rotation", -30, 90, { aaos: 45, ama: 40, msd: 45 }],
  ["hip-external-rotation", "hip", "Hip external rotation", -30, 90, { aaos: 45, ama: 50, msd: 45 }],
  ["knee-flexion", "knee", "Knee flexion", -15, 170, { aaos: 135, ama: 150, msd: 130 }],
  ["knee-extension", "knee", "Knee extension", -60, 20, {}],
  ["shoulder-flexion", "shoulder", "Shoulder flexion", -10, 200, { aaos: 180, ama: 150 }],
  ["shoulder-extension", "shoulder", "Shoulder extension", -10, 90, { aaos: 60, ama: 50, msd: 50 }],
  ["shoulder-abduction", "shoulder", "Shoulder abduction", -10, 200, { aaos: 180, ama: 180 }],
  [
    "shoulder-internal-rotation",
    "shoulder",
    "Shoulder internal rotation",
    -30,
    120,
    { aaos: 70, ama: 90, msd: 90 },
  ],
  [
    "shoulder-external-rotation",
    "shoulder",
    "Shoulder external rotation",
    -30,
    130,
    { aaos: 90, ama: 90, msd: 90 },
  ],
  ["ankle-dorsiflexion", "ankle", "Ankle dorsiflexion", -40, 50, { aaos: 20, ama: 20, msd: 20 }],
  ["ankle-plantarflexion", "ankle", "Ankle plantarflexion", -20, 90, { aaos: 50, ama: 40, msd: 50 }],
];

/** Joint movements that can be recorded, with the published ranges beside them. Sources differ by up to 25 degrees. */
export const movements: readonly Movement[] = rows.map(([key, joint, label, min, max, reference]) => ({
  key,
  joint,
  label,
  bounds: [min, max],
  reference,
}));

export interface RangeFinding {
  readonly movement: string;
  readonly side: "left" | "right";
  readonly way: "active" | "passive";
  /** Whole degrees; below 0 where the start position cannot be reached. */
  readonly degrees: number;
}

export function findMovement(key: string): Movement | null {
  return movements.find((movement) => movement.key === key) ?? null;
}

/** Refuses only what no joint does: a figure outside the gross bounds. */
export function checkRange(finding: RangeFinding): Refusal | null {
  const movement = findMovement(finding.movement);
  if (!movement) return refusal("unknown-movement", "Choose the movement from the list.", "movement");
  const [min, max] = movement.bounds;
  if (Number.isInteger(finding.degrees) && finding.degrees >= min && finding.degrees <= max) return null;
  return refusal(
    "degrees-out-of-bounds",
    `${movement.label} must be a whole number of degrees from ${min} to ${max}. Check the figure and the movement.`,
    "degrees",
  );
}

export interface RangeComparison {
  readonly reference: number;
  /** Found minus reference, in degrees. */
  readonly difference: number;
  readonly source: Source;
}

/** The finding against one named source; null where that source gives no figure for the movement. */
export function compareRange(
  finding: Pick<RangeFinding, "movement" | "degrees">,
  by: ReferenceKey,
): RangeComparison | null {
  const reference = findMovement(finding.movement)?.reference[by];
  if (reference === undefined) return null;
  return { reference, difference: finding.degrees - reference, source: sources[by] };
}
