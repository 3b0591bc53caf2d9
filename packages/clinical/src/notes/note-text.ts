import { headingsOf, type NoteKind } from "./headings";

/** A note's text by heading key. */
export type NoteText = Readonly<Record<string, string>>;

/** The longest text of one heading, in characters. */
export const longestHeading = 8000;

/** The text with line ends as "\n", no space at the ends, and only the headings that the kind has. */
export function tidyNoteText(kind: NoteKind, text: NoteText): Record<string, string> {
  const tidy: Record<string, string> = {};
  for (const { key } of headingsOf(kind)) {
    const words = (text[key] ?? "").replace(/\r\n?/g, "\n").trim();
    if (words !== "") tidy[key] = words;
  }
  return tidy;
}

/** The text as it is written while typing: like tidy, but the space at the end stays, so that the next word may follow. */
export function draftNoteText(kind: NoteKind, text: NoteText): Record<string, string> {
  const draft: Record<string, string> = {};
  for (const { key } of headingsOf(kind)) {
    const words = (text[key] ?? "").replace(/\r\n?/g, "\n");
    if (words.trim() !== "") draft[key] = words;
  }
  return draft;
}

export function isSameText(kind: NoteKind, a: NoteText, b: NoteText): boolean {
  return headingsOf(kind).every(({ key }) => (a[key] ?? "") === (b[key] ?? ""));
}

export interface SignedFacts {
  readonly noteId: string;
  readonly patientId: string;
  readonly kind: NoteKind;
  /** ISO instants. */
  readonly visitAt: string;
  readonly signedAt: string;
  readonly signedName: string;
  readonly registrationNumber: string;
}

/**
 * The exact characters whose hash is kept at signing: who, whom, when, then each heading in order. Lengths come
 * before the words, so that no text can be moved from one heading to the next without changing it.
 */
export function signedForm(facts: SignedFacts, text: NoteText): string {
  const head = [
    "withy-note-1",
    facts.noteId,
    facts.patientId,
    facts.kind,
    facts.visitAt,
    facts.signedAt,
    facts.signedName,
    facts.registrationNumber,
  ];
  const body = headingsOf(facts.kind).map(({ key }) => {
    const words = text[key] ?? "";
    return `${key}:${words.length}:${words}`;
  });
  return [...head, ...body].join("\n");
}
