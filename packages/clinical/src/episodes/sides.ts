export const sides = ["left", "right", "both", "none"] as const;
export type Side = (typeof sides)[number];

/** As it stands beside the patient's name: a side is never out of sight. */
export const sideLabels: Record<Side, string> = {
  left: "Left",
  right: "Right",
  both: "Both sides",
  none: "No side",
};

export interface Region {
  readonly key: string;
  readonly label: string;
  /** False for the middle of the body, where a side would be an invention. */
  readonly hasSides: boolean;
}

/** Our own short list, head to foot. */
export const regions: readonly Region[] = [
  { key: "head", label: "Head and jaw", hasSides: true },
  { key: "neck", label: "Neck", hasSides: true },
  { key: "shoulder", label: "Shoulder", hasSides: true },
  { key: "elbow", label: "Elbow", hasSides: true },
  { key: "wrist-hand", label: "Wrist and hand", hasSides: true },
  { key: "upper-back", label: "Upper back", hasSides: true },
  { key: "lower-back", label: "Lower back", hasSides: true },
  { key: "pelvis", label: "Pelvis", hasSides: true },
  { key: "hip", label: "Hip", hasSides: true },
  { key: "thigh", label: "Thigh", hasSides: true },
  { key: "knee", label: "Knee", hasSides: true },
  { key: "lower-leg", label: "Lower leg", hasSides: true },
  { key: "ankle-foot", label: "Ankle and foot", hasSides: true },
  { key: "balance", label: "Balance and walking", hasSides: false },
  { key: "general", label: "Whole body", hasSides: false },
];

/** Limbs, where a record without a side is a danger. */
const limbs = new Set(["shoulder", "elbow", "wrist-hand", "hip", "thigh", "knee", "lower-leg", "ankle-foot"]);

export function findRegion(key: string): Region | null {
  return regions.find((region) => region.key === key) ?? null;
}

/** "Left hip", "Both knees", "Lower back". */
export function placeWords(regionKey: string, side: Side): string {
  const label = findRegion(regionKey)?.label ?? regionKey;
  if (side === "none") return label;
  if (side === "both") return `${label}, both sides`;
  return `${sideLabels[side]} ${label.toLowerCase()}`;
}

/** Why a side does not fit the region, in a sentence that says what to do; null where it does. */
export function checkSide(regionKey: string, side: Side): string | null {
  const region = findRegion(regionKey);
  if (!region) return "Choose the region from the list.";
  if (!region.hasSides && side !== "none") return `${region.label} has no side. Choose no side.`;
  if (limbs.has(regionKey) && side === "none")
    return `Choose left, right or both for the ${region.label.toLowerCase()}.`;
  return null;
}
