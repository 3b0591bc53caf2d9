import type { Equipment, FormRef, Support } from "../exercises/exercise";

export const programmeModes = ["timed", "sets"] as const;
export type ProgrammeMode = (typeof programmeModes)[number];

/** "each" is one line that is done twice, left and then right; "left" and "right" are lines of their own. */
export const itemSides = ["both", "left", "right", "each"] as const;
export type ItemSide = (typeof itemSides)[number];

/** Whether the rest after the very last interval belongs to the session's time. */
export const lastRests = ["kept", "dropped"] as const;
export type LastRest = (typeof lastRests)[number];

export interface ProgrammeItem {
  readonly id: string;
  readonly exercise: string;
  readonly form: string;
  readonly side: ItemSide;
  readonly support: Support | null;
  /** Seconds of one interval and of the rest after it, used by a timed session. */
  readonly workSeconds: number;
  readonly restSeconds: number;
  /** Used by a session of sets. */
  readonly sets: number;
  readonly repetitions: number;
  readonly repetitionSeconds: number;
  readonly holdSeconds: number;
  readonly restBetweenSetsSeconds: number;
  /** What the therapist adds for this patient, printed under the instructions. */
  readonly note: string;
  /** The form that was chosen before missing equipment made a swap necessary. */
  readonly insteadOf: FormRef | null;
}

export interface Programme {
  readonly mode: ProgrammeMode;
  readonly rounds: number;
  readonly restBetweenRoundsSeconds: number;
  readonly lastRest: LastRest;
  /** Time to change over between exercises in a session of sets. */
  readonly restBetweenItemsSeconds: number;
  readonly sessionsPerWeek: number;
  readonly equipmentMissing: readonly Equipment[];
  readonly advice: string;
  readonly items: readonly ProgrammeItem[];
}
