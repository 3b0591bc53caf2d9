import { z } from "zod";
import { idListField } from "./day";

export const getDiaryWatchInput = z.strictObject({
  /** Absent: the site of the desk. */
  siteIds: idListField,
  /** The id of the last event that was received, on a reconnection. */
  after: z.string().max(40).optional(),
});

/** Which sites a stream tells of, and from when on. */
export interface DiaryWatchView {
  readonly siteIds: readonly string[];
  /** Everything committed before this (milliseconds since the epoch) is known; null on a first opening. */
  readonly since: number | null;
  /** The last event received is too old, or none of ours: everything must be read again. */
  readonly mustReload: boolean;
}

/** One change as a stream carries it: ids and places alone. Names are read through the usual routes. */
export interface LiveChange {
  readonly id: string;
  readonly kind: "booked" | "moved" | "cancelled" | "marked" | "undone";
  readonly appointmentId: string;
  readonly siteId: string;
  readonly therapistId: string;
  readonly startsAt: string;
}

/** The events of a stream by name, each with its data. `reload` and `ended` carry none. */
export interface LiveEvents {
  readonly changes: readonly LiveChange[];
  /** Sites whose held times are not what they were. */
  readonly holds: readonly string[];
  /** Appointments that other people than before have open. */
  readonly presence: readonly string[];
}
