import type { LetterActor, LetterSectionKey, LetterSentence, LetterSource } from "@withy/contracts/letters";
import { shortDate } from "@withy/core/date-words";
import type { PlainDateText } from "@withy/core/zoned-time";
import type { NotedText, Side } from "./discharge-facts";

const small = [
  "no",
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
];

/** "five" up to twelve, then figures. */
export function numberWord(n: number): string {
  return small[n] ?? String(n);
}

/** "a, b and c". */
export function listWords(items: readonly string[]): string {
  if (items.length < 2) return items[0] ?? "";
  return `${items.slice(0, -1).join(", ")} and ${items.at(-1)}`;
}

export function capital(text: string): string {
  return text.charAt(0).toLocaleUpperCase("en-GB") + text.slice(1);
}

/** One space between words, a capital to begin with and a full stop to end with. */
export function sentenceOf(text: string): string {
  const clean = capital(text.replace(/\s+/g, " ").trim());
  return clean === "" || /[.?!…]["’”)]?$/.test(clean) ? clean : `${clean}.`;
}

/** ", left side"; nothing where the problem has no side or names it already. */
export function sideWords(side: Side, beside: string): string {
  const says = new RegExp(`\\b${side === "both" ? "both|bilateral" : side}\\b`, "i");
  if (side === "none" || says.test(beside)) return "";
  return side === "both" ? ", both sides" : `, ${side} side`;
}

export function noteSource(
  note: Pick<NotedText, "noteId" | "noteKind" | "on">,
  today: PlainDateText,
): LetterSource {
  const word = note.noteKind === "initial" ? "Assessment" : "Note";
  return { kind: "note", id: note.noteId, label: `${word}, ${shortDate(note.on, today)}` };
}

/** A sentence as the record says it. */
export function assembled(
  section: LetterSectionKey,
  slug: string,
  text: string,
  source: LetterSource,
  actor: LetterActor | null = null,
): LetterSentence {
  const said = sentenceOf(text);
  return { id: `${section}:${slug}`, text: said, source, assembled: said, actor, keptBecause: null };
}

/** What a note says under one heading: a line of the note is a sentence of the letter. */
export function noted(
  section: LetterSectionKey,
  note: NotedText,
  today: PlainDateText,
  options: { opening?: string; actor?: LetterActor } = {},
): LetterSentence[] {
  const lines = note.text.split(/\n+/).filter((line) => line.trim() !== "");
  const source = noteSource(note, today);
  return lines.map((line, index) => {
    const text = index === 0 && options.opening ? `${options.opening}: ${line.trim()}` : line;
    return assembled(
      section,
      `${note.noteId}-${note.part}-${index + 1}`,
      text,
      source,
      options.actor ?? null,
    );
  });
}
