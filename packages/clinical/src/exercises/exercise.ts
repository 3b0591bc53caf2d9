import type { Figure } from "./pose";

export const regions = ["hip", "knee", "back", "shoulder", "balance", "ankle", "neck", "aerobic"] as const;
export type Region = (typeof regions)[number];

export const regionWords: Record<Region, string> = {
  hip: "Hip",
  knee: "Knee",
  back: "Back",
  shoulder: "Shoulder",
  balance: "Balance",
  ankle: "Ankle and foot",
  neck: "Neck",
  aerobic: "Heart and lungs",
};

/** What an exercise trains. It decides which line of the activity guidance the session counts towards. */
export const trainingKinds = ["strength", "mobility", "balance", "aerobic"] as const;
export type TrainingKind = (typeof trainingKinds)[number];

/** Only what a home may lack. A floor, a bed, a wall and a worktop are places, not equipment. */
export const equipment = [
  "chair",
  "step",
  "stairs",
  "band",
  "weight",
  "kettlebell",
  "ball",
  "cushion",
  "towel",
  "stick",
  "cycle",
] as const;
export type Equipment = (typeof equipment)[number];

export const equipmentWords: Record<Equipment, string> = {
  chair: "firm chair",
  step: "step",
  stairs: "stairs",
  band: "exercise band",
  weight: "hand weight",
  kettlebell: "kettlebell",
  ball: "ball",
  cushion: "cushion",
  towel: "towel",
  stick: "stick or broom handle",
  cycle: "exercise cycle",
};

export const places = ["floor-or-bed", "wall", "worktop", "doorway", "open-floor"] as const;
export type Place = (typeof places)[number];

export const placeWords: Record<Place, string> = {
  "floor-or-bed": "mat or bed",
  wall: "wall",
  worktop: "worktop",
  doorway: "doorway",
  "open-floor": "clear floor",
};

/** Something for the hands. Any of these may be added to any exercise. */
export const supports = ["rail", "worktop", "chair-back", "wall", "stick", "two-sticks", "helper"] as const;
export type Support = (typeof supports)[number];

export const supportWords: Record<Support, string> = {
  rail: "hold the rail",
  worktop: "hold the worktop",
  "chair-back": "hold a heavy chair",
  wall: "fingertips on the wall",
  stick: "one stick",
  "two-sticks": "two sticks",
  helper: "someone beside you",
};

/** Both sides work in one movement, or the left and the right are done one after the other. */
export type Sidedness = "together" | "one-at-a-time";

/** Lowest and highest that the library offers; the clinician may go outside with a reason. */
export type Range = readonly [lowest: number, highest: number];

export interface DoseRange {
  readonly sets: Range;
  readonly repetitions: Range;
  /** Seconds held at the end of each repetition. */
  readonly holdSeconds: Range;
  /** Seconds of movement in one repetition, the hold not counted. */
  readonly repetitionSeconds: Range;
  readonly restSeconds: Range;
  /** Seconds of work in one timed interval. */
  readonly workSeconds: Range;
}

export interface ExerciseForm {
  readonly key: string;
  /** The short line under the exercise's name: "from a low chair, no hands". */
  readonly name: string;
  /** What is different in this form, said to the patient. */
  readonly how: string;
  /** Place on the one scale of difficulty used by every ladder, 1 (least) to 10 (most). */
  readonly level: number;
  readonly needs: readonly Equipment[];
  readonly figure?: Figure;
}

export interface FormRef {
  readonly exercise: string;
  readonly form: string;
}

export interface Exercise {
  readonly key: string;
  readonly name: string;
  readonly region: Region;
  readonly kinds: readonly TrainingKind[];
  readonly purpose: string;
  readonly start: string;
  readonly steps: readonly string[];
  /** Usual cautions. Local policy and the clinician's judgement come first. */
  readonly cautions: readonly string[];
  readonly sides: Sidedness;
  readonly muscles: readonly string[];
  readonly place: Place | null;
  /** Supports that suit this exercise best, first choice first. */
  readonly supports: readonly Support[];
  readonly dose: DoseRange;
  readonly figure: Figure;
  /** The ladder, easiest first. */
  readonly forms: readonly ExerciseForm[];
  /** The form that a new item starts with. */
  readonly standard: string;
  /** What to do where the equipment is not at hand; null where no form needs any. */
  readonly withoutEquipment: FormRef | null;
  /** The exercise that carries on where this ladder ends. */
  readonly leadsTo: string | null;
}
