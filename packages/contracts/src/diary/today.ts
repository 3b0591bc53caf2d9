import type { AppointmentState } from "@withy/diary/appointment-states";
import { z } from "zod";
import { idListField } from "./day";

export const listTodayInput = z.strictObject({
  /** Absent: the site of the desk. */
  siteIds: idListField,
});

/** One line of the day's arrivals, by start. */
export interface TodayArrival {
  readonly appointmentId: string;
  readonly version: number;
  readonly state: AppointmentState;
  readonly startsAt: string;
  readonly startTime: string;
  readonly patientId: string;
  readonly patientName: string;
  readonly bornOn: string;
  readonly serviceName: string;
  readonly therapistName: string;
  readonly roomName: string;
  readonly siteName: string;
  /** The mark that the key at the end of the line makes; null where there is none. */
  readonly nextMark: "arrived" | "in-session" | "fulfilled" | null;
  /** Minutes in the waiting room, for those who have arrived. */
  readonly waitingMinutes: number | null;
  /** What the desk must know, at most one line; null where nothing. */
  readonly remark: string | null;
  readonly owesPence: number | null;
}

export interface TodayGap {
  readonly therapistId: string;
  readonly therapistName: string;
  readonly siteId: string;
  readonly startsAt: string;
  readonly startTime: string;
  readonly minutes: number;
}

export interface TodayOwed {
  readonly patientId: string;
  readonly patientName: string;
  readonly owesPence: number;
  /** The oldest of the open invoices. */
  readonly invoiceId: string;
  readonly reference: string;
  readonly startTime: string;
}

export interface TodayView {
  readonly day: string;
  readonly sites: readonly { readonly id: string; readonly name: string }[];
  readonly arrivals: readonly TodayArrival[];
  /** Those that are over: attended, missed, cancelled. */
  readonly done: readonly TodayArrival[];
  readonly gaps: readonly TodayGap[];
  readonly gapMinutes: number;
  /** Null for those who may not see money. */
  readonly toCollect: readonly TodayOwed[] | null;
  readonly counts: {
    readonly toCome: number;
    readonly seen: number;
    readonly didNotAttend: number;
    readonly cancelled: number;
    readonly waiting: number;
    readonly longestWaitMinutes: number | null;
    /** "17:15", the last visit to come; null where none is. */
    readonly lastTime: string | null;
  };
  readonly pulse: string | null;
}

export const listRecentChangesInput = z.strictObject({
  siteIds: idListField,
  limit: z.coerce.number().int().min(1).max(50).default(20),
});

/** One line of "recent changes": who did what to which visit. */
export interface RecentChange {
  readonly id: string;
  readonly at: string;
  readonly time: string;
  readonly kind: "booked" | "moved" | "cancelled" | "marked" | "undone";
  readonly byName: string;
  /** "moved Jonah Petrie to 09:45", without the name of who did it. */
  readonly what: string;
  readonly appointmentId: string;
  /** Whether this very change may be undone: a cancellation or a mark that is still the last. */
  readonly canUndo: boolean;
  readonly version: number;
}
