import type { AppointmentState } from "@withy/diary/appointment-states";
import { z } from "zod";
import { idField } from "../fields";

export const timelineKinds = ["all", "visits", "notes", "measures", "letters", "money", "messages"] as const;
export type TimelineKind = (typeof timelineKinds)[number];

export const getTimelineInput = z.strictObject({
  patientId: idField,
  kind: z.enum(timelineKinds).default("all"),
  /** The cursor that the page before gave as `next`. */
  before: z
    .string()
    .regex(/^[0-9TZ:.-]{20,30}_[0-9a-f-]{36}$/, "This link is not complete. Start from the newest again.")
    .optional(),
  size: z.coerce.number().int().min(1).max(100).default(30),
});
export type GetTimelineInput = z.input<typeof getTimelineInput>;

interface Entry {
  readonly id: string;
  readonly at: string;
  /** On the site's clock. */
  readonly day: string;
  readonly time: string;
}

export interface VisitEntry extends Entry {
  readonly kind: "visit";
  readonly state: AppointmentState;
  readonly serviceName: string;
  readonly minutes: number;
  readonly therapistName: string;
  readonly siteId: string;
  readonly siteName: string;
  readonly cancelledBy: "patient" | "clinic" | null;
  readonly isLateCancellation: boolean;
}

export interface NoteEntry extends Entry {
  readonly kind: "note";
  readonly authorName: string;
  readonly noteKind: "initial" | "session";
  /** Null for whoever may not read notes: that it was signed is all they see. */
  readonly problem: string | null;
}

export interface MeasureEntry extends Entry {
  readonly kind: "measure";
  readonly measureKey: string;
  readonly measureName: string;
  /** "Pain 62.5, stiffness 50.0", or nothing where no score could be made. */
  readonly result: string;
  readonly takenOn: string;
  readonly episodeId: string;
}

export interface LetterEntry extends Entry {
  readonly kind: "letter";
  readonly reference: string;
  readonly state: "draft" | "signed";
  readonly recipientName: string;
}

export interface InvoiceEntry extends Entry {
  readonly kind: "invoice";
  readonly reference: string;
  readonly state: string;
  readonly totalPence: number;
}

export interface PaymentEntry extends Entry {
  readonly kind: "payment";
  readonly invoiceId: string;
  readonly reference: string;
  readonly method: "cash" | "card" | "terminal" | "bank";
  readonly amountPence: number;
}

export interface MessageEntry extends Entry {
  readonly kind: "message";
  readonly template: string;
  readonly state: string;
}

export type TimelineEntry =
  | VisitEntry
  | NoteEntry
  | MeasureEntry
  | LetterEntry
  | InvoiceEntry
  | PaymentEntry
  | MessageEntry;

/** Newest first. */
export interface TimelineView {
  readonly entries: readonly TimelineEntry[];
  /** Ask with this for what is older; null at the end. */
  readonly next: string | null;
}
