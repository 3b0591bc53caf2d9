import { partsOfDay } from "@withy/diary/time-wishes";
import type { WaitingWishes } from "@withy/diary/waiting-match";
import { type OfferState, type RoundState, type Urgency, urgencies } from "@withy/diary/waiting-words";
import { z } from "zod";
import { idField, optionalText, pageFields, plainDateField, versionField } from "../fields";
import { startField } from "./appointment";
import { idListField } from "./day";

const idsField = z.array(idField).max(20).default([]);

/** An absent or empty wish means any. */
export const waitingWishesField = z.strictObject({
  weekdays: z.array(z.int().min(1).max(7)).max(7).default([]),
  partsOfDay: z.array(z.enum(partsOfDay)).max(3).default([]),
  siteIds: idsField,
  therapistIds: idsField,
  latestOn: plainDateField.nullish().transform((day) => day ?? null),
  noticeHours: z
    .int("Enter whole hours, such as 24.")
    .min(0, "Enter 0 hours or more.")
    .max(336, "Enter 336 hours (two weeks) or fewer.")
    .default(0),
});

const entryFields = {
  serviceId: z.uuid("Choose what the visit is for."),
  wishes: waitingWishesField,
  urgency: z.enum(urgencies, "Say how urgent it is."),
  /** A later visit of the patient, given up when an offer is taken. */
  insteadOfId: idField.nullish().transform((id) => id ?? null),
  deskNote: optionalText(300, "The note"),
};

export const addWaitingEntryInput = z.strictObject({
  patientId: z.uuid("Choose the patient."),
  ...entryFields,
});

export const editWaitingEntryInput = z.strictObject({
  entryId: idField,
  version: versionField,
  ...entryFields,
});

export const withdrawWaitingEntryInput = z.strictObject({ entryId: idField, version: versionField });

export const listWaitingInput = z.strictObject({
  /** Those who would come to this site. */
  siteId: idField.optional(),
  urgency: z.enum(urgencies).optional(),
  patientId: idField.optional(),
  ...pageFields,
});

/** Someone who waits, most urgent first, then who waits longest. */
export interface WaitingRow {
  readonly id: string;
  readonly version: number;
  readonly patient: { readonly id: string; readonly name: string; readonly phone: string | null };
  readonly service: { readonly id: string; readonly name: string; readonly durationMinutes: number };
  readonly urgency: Urgency;
  readonly waitingSince: string;
  readonly waitsDays: number;
  readonly wishes: WaitingWishes;
  /** The wishes in a line; empty where anything will do. */
  readonly wishWords: string;
  readonly insteadOf: { readonly id: string; readonly day: string; readonly startTime: string } | null;
  readonly deskNote: string | null;
  /** The round in which they have an open offer. */
  readonly openRoundId: string | null;
}

export const listPatientVisitsAheadInput = z.strictObject({ patientId: idField });

/** A visit to come, to choose as the one that is given up. */
export interface VisitAhead {
  readonly id: string;
  readonly day: string;
  readonly startTime: string;
  readonly serviceId: string;
  readonly serviceName: string;
  readonly therapistName: string;
}

const timeFields = { siteId: idField, therapistId: idField, startsAt: startField };

export const listOfferMatchesInput = z.strictObject(timeFields);

export interface OfferMatch {
  readonly entryId: string;
  readonly patientId: string;
  readonly patientName: string;
  readonly phone: string | null;
  readonly serviceId: string;
  readonly serviceName: string;
  readonly durationMinutes: number;
  readonly reasons: readonly string[];
  readonly deskNote: string | null;
  /** Whether there is an address for the private link. */
  readonly canReceive: boolean;
  /** What the desk should know before it offers by e-mail; null where nothing. */
  readonly caveat: string | null;
}

/** A time that can be offered, and whom it suits, best first. */
export interface OfferMatchesView {
  readonly siteId: string;
  readonly siteName: string;
  readonly therapistId: string;
  readonly therapistName: string;
  readonly startsAt: string;
  readonly day: string;
  readonly startTime: string;
  readonly freeUntilTime: string;
  readonly freeMinutes: number;
  /** How many are asked at once, and for how long, unless the desk says otherwise. */
  readonly offerCount: number;
  readonly offerMinutes: number;
  /** The round in which this time is on offer already. */
  readonly openRoundId: string | null;
  readonly matches: readonly OfferMatch[];
  readonly others: readonly {
    readonly entryId: string;
    readonly patientName: string;
    readonly whyNot: string;
  }[];
}

export const offerTimeInput = z.strictObject({
  ...timeFields,
  /** Best first; that order is the rank. */
  entryIds: z.array(idField).min(1, "Choose at least one person.").max(20, "Choose 20 people or fewer."),
  minutes: z
    .int("Enter whole minutes.")
    .min(5, "Give at least 5 minutes to answer.")
    .max(2880, "Give two days or less to answer."),
  /** The visit that was cancelled or moved away. */
  freedById: idField.nullish().transform((id) => id ?? null),
});

export const getOfferRoundInput = z.strictObject({ roundId: idField });
export const stopOfferRoundInput = z.strictObject({ roundId: idField, version: versionField });
export const listOfferRoundsInput = z.strictObject({ siteIds: idListField });

/** A round with each person's state. */
export interface OfferRoundView {
  readonly id: string;
  readonly version: number;
  readonly state: RoundState;
  readonly site: { readonly id: string; readonly name: string };
  readonly therapistName: string;
  readonly startsAt: string;
  readonly day: string;
  readonly startTime: string;
  readonly endTime: string;
  readonly createdAt: string;
  readonly byName: string;
  readonly expiresAt: string;
  /** By the site's clock; the day only where it is not today. */
  readonly expiresTime: string;
  readonly appointmentId: string | null;
  readonly offers: readonly {
    readonly id: string;
    readonly rank: number;
    readonly patientId: string;
    readonly patientName: string;
    readonly phone: string | null;
    readonly serviceName: string;
    readonly state: OfferState;
    /** "10:15", by the site's clock. */
    readonly decidedTime: string | null;
    /** Whether the link has gone out: a message that waits or failed is worth a call. */
    readonly message: "waiting" | "sent" | "failed" | "dropped" | null;
  }[];
}

export const listFreedTimesInput = z.strictObject({ siteIds: idListField });

/** A time that a cancelled or moved visit gave back and nobody has taken since. */
export interface FreedTimeRow {
  readonly appointmentId: string;
  readonly how: "cancelled" | "moved";
  readonly siteId: string;
  readonly siteName: string;
  readonly therapistId: string;
  readonly therapistName: string;
  readonly startsAt: string;
  readonly day: string;
  readonly startTime: string;
  readonly minutes: number;
}
