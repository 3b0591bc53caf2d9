import { isPlainDate } from "@withy/core/plain-date";
import { equipmentCodes } from "@withy/diary/equipment";
import { rankConcerns, urgencies, type Weights } from "@withy/diary/rank-time";
import { partsOfDay, type WishKind } from "@withy/diary/time-wishes";
import { z } from "zod";
import { clockTimeField, idField, plainDateField } from "../fields";
import { idListField } from "./day";

const listOf = <T extends z.ZodType>(item: T) =>
  z
    .union([item, z.array(item).max(10)])
    .optional()
    .transform(
      (value) => (value === undefined ? [] : Array.isArray(value) ? value : [value]) as z.output<T>[],
    );

const optionalDate = z.preprocess((v) => (v === "" ? undefined : v), plainDateField.optional());
const optionalTime = z.preprocess((v) => (v === "" ? undefined : v), clockTimeField.optional());

const exactWindow = z
  .string()
  .regex(
    /^\d{4}-\d{2}-\d{2}T([01]\d|2[0-3]):[0-5]\d\/([01]\d|2[0-3]):[0-5]\d$/,
    "Enter a window such as 8 December, 10:00 to 12:00.",
  )
  .refine((text) => isPlainDate(text.slice(0, 10)), "Enter a real date.")
  .refine(
    (text) => text.slice(11, 16) < text.slice(17),
    "A window ends after it begins. Change one of the times.",
  );

/** Read as a query string: lists repeat their name. */
export const findTimesInput = z.strictObject({
  serviceId: idField,
  /** For continuity; absent for a caller who is not registered yet. */
  patientId: idField.optional(),
  /** 1 Monday to 7 Sunday. */
  weekdays: listOf(z.coerce.number().int().min(1).max(7)),
  partsOfDay: listOf(z.enum(partsOfDay)),
  /** Not before this time, and over by that one, by the site's clock. */
  fromTime: optionalTime,
  untilTime: optionalTime,
  siteIds: idListField,
  therapistIds: idListField,
  /** Absent: from now. */
  earliestOn: optionalDate,
  /** Absent: eight weeks on. */
  latestOn: optionalDate,
  /** Exact windows at the practice's clock: "2026-12-08T10:00/12:00". The visit lies within one of them. */
  windows: listOf(exactWindow),
  /** Whether the patient has to reach the room without a step, and what must stand in it. */
  needsStepFree: z.union([z.boolean(), z.stringbool()]).default(false),
  equipment: listOf(
    z.string().refine((code) => equipmentCodes.includes(code), "Choose equipment from the list."),
  ),
  urgency: z.enum(urgencies).default("routine"),
  /** What counts, most first. Absent: the practice's own weights. */
  order: listOf(z.enum(rankConcerns)),
  /** The visit that is to be moved: its own time counts as free. */
  movingId: idField.optional(),
  limit: z.coerce.number().int().min(1).max(30).default(8),
});

export interface FoundTimeView {
  readonly startsAt: string;
  readonly endsAt: string;
  readonly day: string;
  readonly startTime: string;
  readonly endTime: string;
  readonly site: { readonly id: string; readonly name: string };
  readonly therapist: { readonly id: string; readonly name: string };
  readonly room: { readonly id: string; readonly name: string };
  readonly meetsEveryWish: boolean;
  /** Out of five. `knows` is null where no one has seen the patient yet. */
  readonly marks: {
    readonly wish: number;
    readonly wait: number;
    readonly knows: number | null;
    readonly day: number;
  };
  /** Why it ranks where it does: what speaks for it, and what against. Short phrases without a full stop. */
  readonly reasons: readonly string[];
  readonly drawbacks: readonly string[];
}

export interface FoundTimesView {
  readonly times: readonly FoundTimeView[];
  readonly lookedAt: number;
  readonly meetingEveryWish: number;
  /** Milliseconds that the search took on the server. */
  readonly tookMs: number;
  /** Why no time meets every wish, and which wish to give up; null where one does. */
  readonly none: {
    readonly kind: "no-therapist" | "no-free-time" | "no-room" | "wishes";
    readonly message: string;
    readonly relax: { readonly wish: WishKind; readonly times: number; readonly message: string } | null;
  } | null;
  /** The patient's visits so far by therapist, most recent first. */
  readonly seenBy: readonly {
    readonly therapistId: string;
    readonly name: string;
    readonly visits: number;
    readonly lastOn: string;
  }[];
}

export const getBookingChoicesInput = z.strictObject({});

/** What a booking form offers: only what is active, and only sites where the person may book. */
export interface BookingChoicesView {
  readonly sites: readonly {
    readonly id: string;
    readonly name: string;
    readonly zone: string;
    readonly today: string;
  }[];
  readonly services: readonly {
    readonly id: string;
    readonly name: string;
    readonly kind: "initial" | "follow-up" | "other";
    readonly durationMinutes: number;
    readonly cleanDownMinutes: number;
    readonly roomKind: "treatment" | "gym" | "video";
    readonly therapistIds: readonly string[];
  }[];
  /** How the practice ranks times where a search gives no order of its own. */
  readonly weights: Weights;
  readonly therapists: readonly {
    readonly id: string;
    readonly name: string;
    readonly siteIds: readonly string[];
  }[];
  readonly rooms: readonly {
    readonly id: string;
    readonly name: string;
    readonly siteId: string;
    readonly kind: "treatment" | "gym" | "video";
  }[];
}
