import { type Heading, headingsOf, type NoteKind } from "@withy/clinical/notes/headings";

type Text = Readonly<Record<string, string>>;

/** The headings whose words are not the same in both texts. */
export function differingHeadings(kind: NoteKind, mine: Text, theirs: Text): readonly Heading[] {
  return headingsOf(kind).filter(({ key }) => (mine[key] ?? "").trim() !== (theirs[key] ?? "").trim());
}

/** Both texts under each heading that differs, this one first, so that nothing is lost. */
export function bothTexts(kind: NoteKind, mine: Text, theirs: Text): Record<string, string> {
  const both: Record<string, string> = { ...mine };
  for (const { key } of differingHeadings(kind, mine, theirs)) {
    const parts = [mine[key] ?? "", theirs[key] ?? ""]
      .map((part) => part.trim())
      .filter((part) => part !== "");
    both[key] = parts.join("\n");
  }
  return both;
}
