/** The near limb (drawn in ink) first, the far limb (drawn paler) second. Degrees. */
export type Pair = readonly [near: number, far: number];

export const joints = [
  "pelvis",
  "shoulder",
  "head",
  "near-knee",
  "near-ankle",
  "near-toe",
  "far-knee",
  "far-ankle",
  "far-toe",
  "near-elbow",
  "near-hand",
  "far-elbow",
  "far-hand",
] as const;
export type Joint = (typeof joints)[number];

/**
 * A position of the body as joint angles in degrees; the figure faces right.
 * From the side: hip, shoulder, elbow: positive bends forward; knee: positive bends back; ankle: positive
 * lifts the toes. From the front: hip and shoulder: positive goes out to the side.
 */
export interface Pose {
  /** Lean of the trunk from upright: 90 is face down, -90 is on the back. */
  readonly trunk: number;
  /** Bend of the spine: positive rounds it. */
  readonly round: number;
  /** Bend of the neck on the trunk: positive is chin down. */
  readonly neck: number;
  readonly hip: Pair;
  readonly knee: Pair;
  readonly ankle: Pair;
  readonly shoulder: Pair;
  readonly elbow: Pair;
  /** The joint that stands still, and where it is across the 120-unit drawing. */
  readonly fixed: Joint;
  readonly x: number;
  /** Height of the fixed joint over the floor; null lets the lowest point of the body rest on the floor. */
  readonly height: number | null;
  /** Share of the thighs' length that is seen: less than 1 where they point at the reader. */
  readonly seen: Pair;
}

export const propKinds = [
  "chair",
  "stool",
  "step",
  "worktop",
  "wall",
  "bed",
  "ball",
  "cushion",
  "stick",
  "rail",
] as const;
export type PropKind = (typeof propKinds)[number];

export interface Prop {
  readonly kind: PropKind;
  readonly x: number;
}

export interface Figure {
  /** "above" is the front view of somebody lying down: a mat is drawn and no floor. */
  readonly view: "side" | "front" | "above";
  readonly start: Pose;
  readonly end: Pose;
  readonly props: readonly Prop[];
  /** The joint whose path is drawn as the arc of the movement; null for a hold. */
  readonly moves: Joint | null;
}

const pair = (value: number): Pair => [value, value];

export const stand: Pose = {
  trunk: 0,
  round: 0,
  neck: 0,
  hip: pair(0),
  knee: pair(0),
  ankle: pair(0),
  shoulder: [4, 4],
  elbow: [8, 8],
  fixed: "near-ankle",
  x: 54,
  height: null,
  seen: [1, 1],
};

export const sit: Pose = {
  ...stand,
  trunk: 6,
  hip: pair(96),
  knee: pair(90),
  shoulder: pair(40),
  elbow: pair(30),
  fixed: "near-ankle",
  x: 64,
};

export const lieOnBack: Pose = {
  ...stand,
  trunk: -90,
  ankle: pair(0),
  shoulder: [6, 6],
  elbow: [4, 4],
  fixed: "pelvis",
  x: 55,
};

/** On the back with the knees bent and the feet flat. */
export const crookLying: Pose = {
  ...lieOnBack,
  hip: [42, 45],
  knee: [114, 117],
  ankle: pair(-18),
  fixed: "near-ankle",
  x: 86,
};

/** From crook lying, the hips lifted until the thighs and the trunk are one slope. */
export const bridged: Pose = {
  ...crookLying,
  trunk: -122,
  neck: 32,
  hip: [-26, -23],
  knee: [92, 95],
  ankle: pair(-4),
  shoulder: pair(-28),
  elbow: pair(0),
};

export const lieOnFront: Pose = {
  ...stand,
  trunk: 90,
  ankle: pair(-80),
  neck: -6,
  shoulder: pair(150),
  elbow: pair(30),
  fixed: "pelvis",
  x: 62,
};

/** Seen from the front: the near limbs are the upper ones. */
export const lieOnSide: Pose = {
  ...stand,
  trunk: -90,
  hip: [0, 0],
  shoulder: [6, 172],
  elbow: [10, 0],
  ankle: pair(-60),
  fixed: "pelvis",
  x: 56,
};

export const allFours: Pose = {
  ...stand,
  trunk: 84,
  neck: -10,
  hip: pair(84),
  knee: pair(90),
  ankle: pair(-80),
  shoulder: pair(84),
  elbow: pair(0),
  fixed: "near-knee",
  x: 40,
};

/** From the front, upright. */
export const standFront: Pose = {
  ...stand,
  hip: pair(3),
  shoulder: pair(10),
  elbow: pair(0),
  fixed: "far-ankle",
  x: 54,
};

/** From the front, on a chair: the thighs point at the reader. */
export const sitFront: Pose = {
  ...standFront,
  hip: pair(14),
  knee: pair(12),
  shoulder: pair(16),
  elbow: pair(-14),
  seen: [0.32, 0.32],
};

export function pose(from: Pose, change: Partial<Pose>): Pose {
  return { ...from, ...change };
}

/** A figure from the side. */
export function side(start: Pose, end: Pose, moves: Joint | null, ...props: Prop[]): Figure {
  return { view: "side", start, end, moves, props };
}

/** A figure from the front. */
export function front(start: Pose, end: Pose, moves: Joint | null, ...props: Prop[]): Figure {
  return { view: "front", start, end, moves, props };
}

/** A figure lying on a mat, seen from above. */
export function above(start: Pose, end: Pose, moves: Joint | null, ...props: Prop[]): Figure {
  return { view: "above", start, end, moves, props };
}

export function prop(kind: PropKind, x: number): Prop {
  return { kind, x };
}
