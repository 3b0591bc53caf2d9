import { type Refusal, refusal } from "@withy/core/refusal";
import { headingsOf, type NoteKind } from "./headings";
import { longestHeading, type NoteText } from "./note-text";
import { type NoteAct, type NoteState, noteMoves } from "./states";

export interface NoteStanding {
  readonly kind: NoteKind;
  readonly state: NoteState;
  readonly authorId: string;
  readonly authorName: string;
}

const isAllowed = (state: NoteState, act: NoteAct): boolean => noteMoves[state][act] !== undefined;

function signedAlready(): Refusal {
  return refusal(
    "note-signed",
    "This note is signed and can no longer be changed. Write an addendum instead.",
  );
}

function someoneElses(authorName: string): Refusal {
  return refusal(
    "not-the-author",
    `${authorName} began this note, and only ${authorName} may write or sign it. Read it, or write your own for your own visit.`,
  );
}

/** Whether this person may write in the note now. */
export function checkWrite(note: NoteStanding, writerId: string): Refusal | null {
  if (!isAllowed(note.state, "write")) return signedAlready();
  return note.authorId === writerId ? null : someoneElses(note.authorName);
}

/** A heading that is longer than the record holds, named. */
export function checkLength(kind: NoteKind, text: NoteText): Refusal | null {
  const long = headingsOf(kind).find(({ key }) => (text[key] ?? "").length > longestHeading);
  if (!long) return null;
  return refusal(
    "heading-too-long",
    `${long.label} is longer than ${longestHeading} characters. Shorten it, or put the rest under another heading.`,
    `body.${long.key}`,
  );
}

/** The required headings that hold no words. */
export function emptyHeadings(kind: NoteKind, text: NoteText): { key: string; label: string }[] {
  return headingsOf(kind)
    .filter(({ key, isRequired }) => isRequired && (text[key] ?? "").trim() === "")
    .map(({ key, label }) => ({ key, label }));
}

function listed(labels: readonly string[]): string {
  if (labels.length < 2) return labels.join("");
  return `${labels.slice(0, -1).join(", ")} and ${labels[labels.length - 1]}`;
}

/**
 * Whether this person may sign the note as it stands: a draft of their own, every required heading filled, and a
 * registration number to print. Signing is for good.
 */
export function checkSign(
  note: NoteStanding & { readonly text: NoteText },
  signer: { readonly id: string; readonly registrationNumber: string | null },
): Refusal | null {
  if (!isAllowed(note.state, "sign")) return signedAlready();
  if (note.authorId !== signer.id) return someoneElses(note.authorName);
  if (signer.registrationNumber === null) {
    return refusal(
      "no-registration-number",
      "Your registration number is missing, so the note cannot be signed. Ask the practice owner to add it to your staff record.",
    );
  }
  const empty = emptyHeadings(note.kind, note.text);
  const first = empty[0];
  if (first) {
    return refusal(
      "headings-empty",
      `Write something under ${listed(empty.map((h) => h.label))}, then sign.`,
      `body.${first.key}`,
    );
  }
  return checkLength(note.kind, note.text);
}

/** Whether an addendum may be written: only to a signed note, with its words and the reason for it. */
export function checkAddendum(
  note: Pick<NoteStanding, "state">,
  addendum: { text: string; reason: string },
): Refusal | null {
  if (!isAllowed(note.state, "addendum")) {
    return refusal(
      "note-not-signed",
      "This note is still a draft. Change the note itself, or sign it first.",
    );
  }
  if (addendum.reason.trim() === "")
    return refusal("reason-missing", "Say why you are adding this.", "reason");
  return addendum.text.trim() === "" ? refusal("text-missing", "Write what you want to add.", "text") : null;
}
