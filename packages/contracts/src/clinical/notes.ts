import type { Side } from "@withy/clinical/episodes/sides";
import type { FlagAnswer } from "@withy/clinical/findings/red-flags";
import { z } from "zod";
import { idField, plainDateField, requiredText, versionField } from "../fields";
import type { ClinicalPatient } from "./episodes";

/** Text by heading key. The lengths are the rule's to refuse, so that the sentence can name the heading. */
const bodyField = z.record(z.string().max(40), z.string().max(20_000));

export const startNoteInput = z.strictObject({
  appointmentId: idField,
  /** Needed where the visit belongs to no episode yet. */
  episodeId: idField.nullish(),
});
export type StartNoteInput = z.input<typeof startNoteInput>;

export const noteIdInput = z.strictObject({ noteId: idField });

export const saveNoteDraftInput = z.strictObject({ noteId: idField, version: versionField, body: bodyField });
export type SaveNoteDraftInput = z.input<typeof saveNoteDraftInput>;

export const signNoteInput = z.strictObject({ noteId: idField, version: versionField });
export type SignNoteInput = z.input<typeof signNoteInput>;

export const addAddendumInput = z.strictObject({
  noteId: idField,
  reason: requiredText(200, "Say why you are adding this."),
  text: requiredText(8000, "Write what you want to add."),
});
export type AddAddendumInput = z.input<typeof addAddendumInput>;

export const dayListInput = z.strictObject({ day: plainDateField.optional() });
export const unsignedNotesInput = z.strictObject({});

export interface AddendumView {
  readonly id: string;
  readonly text: string;
  readonly reason: string;
  readonly authorName: string;
  readonly registrationNumber: string | null;
  readonly writtenAt: string;
}

/** The note of the visit before, read beside the one that is written. */
export interface EarlierNote {
  readonly id: string;
  readonly kind: "initial" | "session";
  readonly state: "draft" | "signed";
  readonly visitNumber: number;
  readonly visitAt: string;
  readonly body: Readonly<Record<string, string>>;
}

export interface NoteView {
  readonly id: string;
  readonly kind: "initial" | "session";
  readonly state: "draft" | "signed";
  readonly body: Readonly<Record<string, string>>;
  readonly version: number;
  readonly visitNumber: number;
  readonly visitAt: string;
  readonly visitEndsAt: string | null;
  readonly updatedAt: string;
  readonly authorName: string;
  /** Whether the reader may write and sign: the author, while it is a draft. */
  readonly canWrite: boolean;
  readonly signedAt: string | null;
  readonly signedName: string | null;
  readonly registrationNumber: string | null;
  readonly bodyHash: string | null;
  /** Times of visit and entry in words; a late entry says so. */
  readonly entryWords: string;
  readonly isLateEntry: boolean;
  readonly addenda: readonly AddendumView[];
  readonly patient: ClinicalPatient;
  readonly episode: {
    readonly id: string;
    readonly problem: string;
    readonly region: string;
    readonly side: Side;
    readonly place: string;
    readonly state: "open" | "discharged";
    readonly redFlags: Readonly<Record<string, FlagAnswer>>;
    readonly version: number;
  };
  readonly siteName: string;
  readonly zone: string;
  readonly earlier: EarlierNote | null;
}

export interface SavedNote {
  readonly version: number;
  readonly savedAt: string;
}

/** Sent with "stale", so that neither text is lost. */
export interface StaleNote {
  readonly theirs: {
    readonly version: number;
    readonly body: Readonly<Record<string, string>>;
    readonly savedAt: string;
  };
  readonly yours: { readonly version: number; readonly body: Readonly<Record<string, string>> };
}

export interface DayVisit {
  readonly appointmentId: string;
  readonly startsAt: string;
  readonly endsAt: string;
  readonly state: string;
  readonly patientId: string;
  readonly patientName: string;
  readonly siteName: string;
  readonly serviceName: string;
  readonly isFirstVisit: boolean;
  readonly episodeId: string | null;
  readonly note: { readonly id: string; readonly state: "draft" | "signed" } | null;
}

export interface DayList {
  readonly day: string;
  readonly zone: string;
  readonly visits: readonly DayVisit[];
}

/** One thing that still waits for the therapist's name: a draft, or a visit without a note. */
export interface UnsignedItem {
  readonly noteId: string | null;
  readonly appointmentId: string | null;
  readonly patientId: string;
  readonly patientName: string;
  readonly visitAt: string;
  readonly kind: "initial" | "session" | null;
  readonly episodeId: string | null;
  readonly emptyHeadings: readonly string[];
}
