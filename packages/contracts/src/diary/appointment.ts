import type { AppointmentState } from "@withy/diary/appointment-states";
import { z } from "zod";
import { idField, optionalText, requiredText, versionField } from "../fields";

const localTime = /^\d{4}-\d{2}-\d{2}T([01]\d|2[0-3]):[0-5]\d$/;

/**
 * When a visit starts: an instant ("2026-12-08T10:15:00.000Z", as views carry it) or what the clock at the site
 * shows ("2026-12-08T10:15", as a person types it).
 */
export const startField = z
  .string("Choose a day and a time.")
  .refine(
    (text) => localTime.test(text) || z.iso.datetime({ offset: true }).safeParse(text).success,
    "Enter a day and a time such as 10:15.",
  );

const overrideReason = optionalText(200, "The reason");

export const bookAppointmentInput = z.strictObject({
  patientId: idField,
  serviceId: idField,
  therapistId: idField,
  siteId: idField,
  /** Absent: a free room of the service's kind is chosen. */
  roomId: idField.nullish().transform((id) => id ?? null),
  startsAt: startField,
  /** Absent: the service's own length. */
  durationMinutes: z
    .int("Enter a length in minutes.")
    .min(5, "Enter at least 5 minutes.")
    .max(480, "Enter 480 minutes or fewer.")
    .nullish()
    .transform((n) => n ?? null),
  /** Whether the patient has to reach the room without a step. */
  needsStepFree: z.boolean().default(false),
  episodeId: idField.nullish().transform((id) => id ?? null),
  deskNote: optionalText(300, "The desk note"),
  /** Why it is booked outside working hours or in blocked time. */
  overrideReason,
});

export const moveAppointmentInput = z.strictObject({
  appointmentId: idField,
  version: versionField,
  startsAt: startField,
  /** Absent: as it is now. With another site a room there is chosen. */
  siteId: idField.optional(),
  therapistId: idField.optional(),
  /** Null: any free room of the service's kind. */
  roomId: idField.nullable().optional(),
  durationMinutes: z.int("Enter a length in minutes.").min(5).max(480).optional(),
  overrideReason,
});

export const cancelAppointmentInput = z.strictObject({
  appointmentId: idField,
  version: versionField,
  by: z.enum(["patient", "clinic"], "Say who cancels: the patient or the clinic."),
  reason: requiredText(200, "Say why, in a few words."),
});

/** Undoes a cancellation, or the last mark. */
export const undoInput = z.strictObject({ appointmentId: idField, version: versionField });

export const markAppointmentInput = z.strictObject({
  appointmentId: idField,
  version: versionField,
  to: z.enum(["confirmed", "arrived", "in-session", "fulfilled", "noshow"]),
});

export const getAppointmentInput = z.strictObject({ appointmentId: idField });

/** One visit with everything that a desk or a therapist acts on. No clinical text. */
export interface AppointmentView {
  readonly id: string;
  /** Send it back with every change. */
  readonly version: number;
  readonly state: AppointmentState;
  readonly site: { readonly id: string; readonly name: string; readonly zone: string };
  readonly therapist: { readonly id: string; readonly name: string };
  readonly room: { readonly id: string; readonly name: string };
  readonly service: {
    readonly id: string;
    readonly name: string;
    readonly kind: "initial" | "follow-up" | "other";
  };
  readonly patient: AppointmentPatient;
  readonly episodeId: string | null;
  /** The course that it was booked with, where it was. */
  readonly courseId: string | null;
  /** Instants as ISO 8601 in UTC. */
  readonly startsAt: string;
  readonly endsAt: string;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
  /** By the site's clock: "2026-12-01", "10:45", "11:15". */
  readonly day: string;
  readonly startTime: string;
  readonly endTime: string;
  readonly deskNote: string | null;
  readonly overrideReason: string | null;
  readonly arrivedAt: string | null;
  readonly sessionStartedAt: string | null;
  readonly sessionEndedAt: string | null;
  readonly cancellation: AppointmentCancellation | null;
  /** Whether a cancellation now would be late by the practice's notice. */
  readonly isLateToCancel: boolean;
  /** Marks that are possible now, in order; `cancelled` among them where it may be cancelled. */
  readonly next: readonly AppointmentState[];
  /** The state that "undo" goes back to, or null where something depends on the present one. */
  readonly undoTo: AppointmentState | null;
  readonly canMove: boolean;
  /** What the patient owes in pence over all their invoices; null for those who may not see money. */
  readonly owesPence: number | null;
  /** The patient's other visits nearest to this one. */
  readonly previousVisit: VisitMention | null;
  readonly nextVisit: VisitMention | null;
}

export interface AppointmentPatient {
  readonly id: string;
  readonly name: string;
  readonly preferredName: string | null;
  readonly bornOn: string;
  readonly phone: string | null;
  readonly email: string | null;
  readonly communicationNeeds: string | null;
  /** Alerts for everyone; clinical ones are left out. */
  readonly alerts: readonly string[];
}

export interface AppointmentCancellation {
  readonly at: string;
  readonly by: "patient" | "clinic";
  readonly reason: string;
  readonly isLate: boolean;
}

export interface VisitMention {
  readonly id: string;
  readonly day: string;
  readonly startTime: string;
  readonly state: AppointmentState;
  readonly therapistName: string;
}

/**
 * What comes with the refusal `slot-taken` (in the problem's `more`): what is in the way, and the next free times
 * of the same therapist.
 */
export interface SlotTakenDetail {
  readonly takenBy: {
    readonly appointmentId: string;
    readonly patientName: string;
    readonly therapistName: string;
    readonly roomName: string;
    readonly startTime: string;
    readonly endTime: string;
  } | null;
  readonly nextFree: readonly {
    readonly startsAt: string;
    readonly day: string;
    readonly startTime: string;
    readonly roomId: string;
  }[];
}

/** What comes with the refusal `stale`: the visit as it stands now. */
export interface StaleAppointmentDetail {
  readonly current: AppointmentView;
}
