import type { AppointmentState } from "@withy/diary/appointment-states";
import { z } from "zod";
import { idField, plainDateField } from "../fields";

/** A list in a query string: absent, one value or several. */
export const idListField = z
  .union([idField, z.array(idField).max(50)])
  .optional()
  .transform((value) => (value === undefined ? [] : typeof value === "string" ? [value] : value));

export const getDiaryDayInput = z.strictObject({
  /** The day by the sites' clocks; absent: today. */
  day: plainDateField.optional(),
  /** Absent: the site of the desk. */
  siteIds: idListField,
  by: z.enum(["therapist", "room"]).default("therapist"),
});

export const getTherapistWeekInput = z.strictObject({
  therapistId: idField,
  /** Any day of the week, which runs from Monday; absent: this week. */
  day: plainDateField.optional(),
});

/** A visit as it stands in a grid. Minutes are minutes after midnight by the site's clock. */
export interface DayAppointment {
  readonly id: string;
  readonly version: number;
  readonly state: AppointmentState;
  readonly startsAt: string;
  readonly endsAt: string;
  readonly fromMinute: number;
  readonly untilMinute: number;
  readonly cleanDownMinutes: number;
  readonly siteId: string;
  readonly therapistId: string;
  readonly therapistName: string;
  readonly roomId: string;
  readonly roomName: string;
  readonly patientId: string;
  readonly patientName: string;
  readonly serviceId: string;
  readonly serviceName: string;
  readonly serviceKind: "initial" | "follow-up" | "other";
  readonly hasDeskNote: boolean;
}

export interface DayHours {
  readonly fromMinute: number;
  readonly untilMinute: number;
}

/** Time in a column that cannot be booked: leave, a block, a break of the working pattern. */
export interface DayBlock extends DayHours {
  readonly kind: "leave" | "blocked" | "break";
  readonly reason: string;
}

/** One therapist at one site, or one room. */
export interface DayColumn {
  readonly id: string;
  readonly name: string;
  readonly siteId: string;
  /** Working hours with breaks taken out; a room's are the site's opening hours. */
  readonly hours: readonly DayHours[];
  readonly blocks: readonly DayBlock[];
  /** What can still be booked, from now on where the day is today. */
  readonly free: readonly DayHours[];
  readonly freeMinutes: number;
  /** Cancelled visits included; all others never overlap. */
  readonly appointments: readonly DayAppointment[];
}

export interface DaySite {
  readonly id: string;
  readonly name: string;
  readonly zone: string;
  /** Null where it is closed that day, for the reason given. */
  readonly hours: DayHours | null;
  readonly closedReason: string | null;
}

export interface DiaryDayView {
  readonly day: string;
  readonly by: "therapist" | "room";
  readonly sites: readonly DaySite[];
  /** The first and last hour that a grid must show, in minutes. */
  readonly bounds: DayHours;
  /** What the first site's clock shows now, in minutes, or null on another day. */
  readonly nowMinute: number | null;
  readonly columns: readonly DayColumn[];
  readonly counts: { readonly booked: number; readonly waiting: number; readonly gaps: number };
  /** Changes when anything in the diary of these sites does; see DiaryPulseView. */
  readonly pulse: string | null;
}

export interface WeekDay {
  readonly day: string;
  /** Working hours at each site that day. */
  readonly sites: readonly {
    readonly id: string;
    readonly name: string;
    readonly hours: readonly DayHours[];
  }[];
  readonly blocks: readonly DayBlock[];
  readonly closedReason: string | null;
  readonly freeMinutes: number;
  readonly appointments: readonly DayAppointment[];
}

export interface TherapistWeekView {
  readonly therapist: { readonly id: string; readonly name: string };
  readonly zone: string;
  /** Monday to Sunday. */
  readonly days: readonly WeekDay[];
  readonly bounds: DayHours;
}

export const getDiaryPulseInput = z.strictObject({ siteIds: idListField });

/** Asked every two seconds; where it differs from the day's own `pulse`, the day is read again. */
export interface DiaryPulseView {
  readonly pulse: string | null;
}
