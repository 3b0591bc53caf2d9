import type { AppointmentState } from "@withy/diary/appointment-states";
import { type CourseRhythm, longestCourse } from "@withy/diary/series";
import { z } from "zod";
import { clockTimeField, idField, optionalText, plainDateField, requiredText, versionField } from "../fields";
import { startField } from "./appointment";

const visitsField = z.coerce
  .number("Enter how many visits.")
  .int("Enter a whole number of visits.")
  .min(1, "Enter at least 1 visit.")
  .max(longestCourse, `Enter ${longestCourse} visits or fewer.`);

const weekdayField = z.coerce.number().int().min(1).max(7);

/** What a course is to be. Read as a query string too: weekdays repeat their name. */
const courseWish = {
  patientId: idField,
  serviceId: idField,
  therapistId: idField,
  siteId: idField,
  firstDay: plainDateField,
  /** By the site's clock, kept over a change of the clocks. */
  startTime: clockTimeField,
  visits: visitsField,
  /** Days from one visit to the next; 7 where absent. Not read where weekdays are given. */
  everyDays: z.coerce
    .number("Enter how many days lie between visits.")
    .int("Enter whole days.")
    .min(1, "Enter at least 1 day.")
    .max(120, "Enter 120 days or fewer.")
    .default(7),
  /** 1 Monday to 7 Sunday. */
  weekdays: z
    .union([weekdayField, z.array(weekdayField).max(7)])
    .optional()
    .transform((value) => (value === undefined ? [] : [value].flat())),
};

/** Another start for one visit, by its place in the course from 1. */
const changesField = z
  .array(
    z.strictObject({
      position: z.int().min(1).max(longestCourse),
      startsAt: startField,
      roomId: idField.nullish().transform((id) => id ?? null),
    }),
  )
  .max(longestCourse)
  .default([]);

export const previewCourseInput = z.strictObject(courseWish);

export const bookCourseInput = z.strictObject({
  ...courseWish,
  episodeId: idField.nullish().transform((id) => id ?? null),
  deskNote: optionalText(300, "The desk note"),
  changes: changesField,
});

export const previewExtensionInput = z.strictObject({ courseId: idField, visits: visitsField });

export const extendCourseInput = z.strictObject({
  courseId: idField,
  version: versionField,
  visits: visitsField,
  changes: changesField,
});

export const shiftCourseInput = z.strictObject({
  courseId: idField,
  version: versionField,
  /** Later where above nought, earlier below it. */
  days: z
    .int("Enter by how many days.")
    .min(-120, "Enter 120 days or fewer.")
    .max(120, "Enter 120 days or fewer.")
    .refine((days) => days !== 0, "Enter a number of days other than 0."),
});

export const cancelCourseInput = z.strictObject({
  courseId: idField,
  version: versionField,
  by: z.enum(["patient", "clinic"], "Say who cancels: the patient or the clinic."),
  reason: requiredText(200, "Say why, in a few words."),
});

export const undoCancelCourseInput = z.strictObject({ courseId: idField, version: versionField });
export const getCourseInput = z.strictObject({ courseId: idField });
export const listCoursesInput = z.strictObject({ patientId: idField });

export interface FreeStart {
  readonly startsAt: string;
  readonly day: string;
  readonly startTime: string;
  readonly roomId: string;
}

export interface ProposedVisit {
  /** From 1. */
  readonly position: number;
  readonly day: string;
  readonly startTime: string;
  /** "taken": someone has the time; "refused": a rule is against it. */
  readonly state: "free" | "taken" | "refused";
  /** Why it cannot be booked there; null where it can. */
  readonly why: string | null;
  readonly roomName: string | null;
  /** The next free times of the same therapist, none of them in the way of another visit of the course. */
  readonly alternatives: readonly FreeStart[];
}

export interface CourseProposal {
  readonly visits: readonly ProposedVisit[];
  /** What the patient's payer has authorised; null where no limit stands. */
  readonly limit: {
    readonly payerName: string;
    readonly authorised: number;
    readonly used: number;
    readonly left: number;
  } | null;
  /** Why the payer's limit forbids so many visits; null where it does not. */
  readonly refusal: string | null;
}

export interface CourseVisit {
  readonly id: string;
  readonly version: number;
  readonly day: string;
  readonly startTime: string;
  readonly endTime: string;
  readonly state: AppointmentState;
  readonly therapistName: string;
  readonly roomName: string;
  /** Whether it is still to come and may be shifted or cancelled with the rest. */
  readonly isRest: boolean;
}

export interface CourseView {
  readonly id: string;
  readonly version: number;
  readonly patient: { readonly id: string; readonly name: string };
  readonly service: { readonly id: string; readonly name: string };
  readonly therapist: { readonly id: string; readonly name: string };
  readonly site: { readonly id: string; readonly name: string; readonly zone: string };
  readonly rhythm: CourseRhythm;
  readonly startTime: string;
  readonly plannedVisits: number;
  readonly visits: readonly CourseVisit[];
  /** How many visits the last cancelling of the rest took, while it can be undone; 0 where it cannot. */
  readonly undoableVisits: number;
  readonly may: { readonly book: boolean; readonly cancel: boolean };
}

/** What undoing a cancelled rest brought back, and what it could not. */
export interface CourseUndone {
  readonly course: CourseView;
  readonly lost: readonly { readonly day: string; readonly startTime: string; readonly why: string }[];
}

export interface CourseRow {
  readonly id: string;
  readonly serviceName: string;
  readonly therapistName: string;
  readonly rhythm: CourseRhythm;
  readonly startTime: string;
  readonly plannedVisits: number;
  readonly firstDay: string | null;
  readonly lastDay: string | null;
  /** Visits that are still to come. */
  readonly restVisits: number;
}
