/**
 * How names are compared: accents, case, hyphens and apostrophes forgiven, so that "Łukaszewska", "lukaszewska"
 * and "LUKASZEWSKA" are one. The database keeps this form beside the name for prefix search.
 */
export function foldName(text: string): string {
  return text
    .normalize("NFD")
    .replace(/\p{M}+/gu, "")
    .toLowerCase()
    .replace(/[łđøßæœðþı]/g, (c) => folded[c] ?? c)
    .replace(/['‘’ʼ`´]/g, "")
    .replace(/[^\p{L}\p{N}]+/gu, " ")
    .trim();
}

const folded: Record<string, string> = {
  ł: "l",
  đ: "d",
  ø: "o",
  ß: "ss",
  æ: "ae",
  œ: "oe",
  ð: "d",
  þ: "th",
  ı: "i",
};

const letters = new Intl.Segmenter("en-GB", { granularity: "grapheme" });

const firstLetter = (name: string): string =>
  [...letters.segment(name.normalize("NFC").trim())][0]?.segment.toLocaleUpperCase("en-GB") ?? "";

/** "P. O." of given and family name, where a full name would tell too much. Empty parts are left out. */
export function initialsOf(givenName: string, familyName: string): string {
  return [firstLetter(givenName), firstLetter(familyName)]
    .filter((letter) => letter !== "")
    .map((letter) => `${letter}.`)
    .join(" ");
}
