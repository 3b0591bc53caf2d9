import { z } from "zod";
import { idField, requiredText, versionField } from "../fields";
import type { JobStateCode } from "../jobs";
import { startField } from "./appointment";

/** Whose visits must move, or which room's: exactly one of the two. */
export const planCoverInput = z.strictObject({
  therapistId: idField.nullish().transform((id) => id ?? null),
  roomId: idField.nullish().transform((id) => id ?? null),
  startsAt: startField,
  endsAt: startField,
  reason: requiredText(120, "Say why, in a few words."),
});

export const coverPlanInput = z.strictObject({ coverPlanId: idField });
export const listCoverPlansInput = z.strictObject({});

export const coverMoveInput = z.strictObject({ coverPlanId: idField, coverMoveId: idField });

/** Whether the patient is told of the move, or rung first; or another place for the visit. */
export const decideCoverMoveInput = z.strictObject({
  coverPlanId: idField,
  coverMoveId: idField,
  version: versionField,
  decision: z.enum(["change", "keep", "phone"]),
  /** Where to; with "change" only. */
  place: z
    .strictObject({ startsAt: startField, therapistId: idField, siteId: idField, roomId: idField })
    .nullish()
    .transform((place) => place ?? null),
});

export const changeCoverPlanInput = z.strictObject({ coverPlanId: idField, version: versionField });

export type CoverPlanState = "solving" | "ready" | "applied" | "undone" | "dropped";

/** A place in words, by the clock of its site. */
export interface CoverPlaceView {
  readonly startsAt: string;
  readonly day: string;
  readonly startTime: string;
  readonly site: { readonly id: string; readonly name: string };
  readonly therapist: { readonly id: string; readonly name: string };
  readonly room: { readonly id: string; readonly name: string };
  readonly cost: number;
  readonly reasons: readonly string[];
}

export interface CoverMoveView {
  readonly id: string;
  readonly appointmentId: string;
  readonly patient: { readonly id: string; readonly name: string; readonly phone: string | null };
  readonly serviceName: string;
  readonly before: CoverPlaceView;
  /** Null: no place was found, and `problem` says why. */
  readonly place: CoverPlaceView | null;
  readonly problem: string | null;
  readonly decision: "keep" | "change" | "phone";
  /** How the patient hears of it: a message, or the desk rings (asked for, or without an address); another room is told to nobody. */
  readonly tells: "message" | "ring" | "nobody";
  readonly isApplied: boolean;
}

export interface CoverOutcome {
  readonly visits: number;
  readonly placed: number;
  readonly candidates: number;
  /** Points of change of the plan as it was found, before anyone decided otherwise. */
  readonly points: number;
  readonly solveMs: number;
  /** Whether it is shown that no other plan costs less. */
  readonly isProved: boolean;
  /** Visits at sites out of the planner's reach: they are not in the plan. */
  readonly outOfReach: number;
  /** Classes in that time: they are not in the plan either. */
  readonly classes: number;
}

export interface CoverPlanView {
  readonly id: string;
  readonly version: number;
  readonly state: CoverPlanState;
  readonly cause: { readonly kind: "therapist" | "room"; readonly id: string; readonly name: string };
  readonly reason: string;
  readonly startDay: string;
  readonly startTime: string;
  readonly endDay: string;
  readonly endTime: string;
  readonly zone: string;
  /** While it is being worked out. */
  readonly job: {
    readonly state: JobStateCode;
    readonly done: number;
    readonly total: number;
    readonly problem: string | null;
  } | null;
  readonly outcome: CoverOutcome | null;
  readonly moves: readonly CoverMoveView[];
  /** Until when the whole of it may be taken back; null where it may not. */
  readonly undoUntil: string | null;
}

export interface CoverPlanRow {
  readonly id: string;
  readonly state: CoverPlanState;
  readonly causeName: string;
  readonly reason: string;
  readonly startDay: string;
}

/** What comes with a refusal to apply or to undo: the visits that are in the way. */
export interface CoverRefusalDetail {
  readonly visits: readonly {
    readonly appointmentId: string;
    readonly patientName: string;
    readonly when: string;
  }[];
}
