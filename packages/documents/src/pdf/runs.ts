import { type Face, fontsOf } from "./faces";

/** A stretch of text in one face, as a caller writes it. */
export interface Span {
  readonly text: string;
  readonly face: Face;
}

/** A stretch of text in one font file, ready to draw. */
export interface Run {
  readonly text: string;
  readonly fontPath: string;
}

const graphemes = new Intl.Segmenter("en-GB", { granularity: "grapheme" });
const unprintable = /[\p{Cc}\p{Cf}\p{Co}\p{Cs}]/gu;

function fontFor(grapheme: string, face: Face): { path: string; shown: string } {
  const fonts = fontsOf(face);
  const points = [...grapheme].map((c) => c.codePointAt(0) ?? 0);
  const whole = fonts.find((font) => points.every(font.covers));
  if (whole) return { path: whole.path, shown: grapheme };
  const last = fonts.at(-1);
  if (!last) throw new Error(`The face ${face} names no font`);
  // A mark that says "a character is missing here": a dropped letter in a name would go unseen.
  return { path: last.path, shown: "\uFFFD" };
}

/**
 * Splits a span where the font must change: pdfkit draws one font at a time, and prints an empty box for what
 * that font lacks. A letter and its combining marks stay together.
 */
export function runsOf(span: Span): Run[] {
  const runs: { text: string; fontPath: string }[] = [];
  const clean = span.text.normalize("NFC").replace(unprintable, (c) => (/\s/.test(c) ? " " : ""));
  for (const { segment } of graphemes.segment(clean)) {
    const { path, shown } = fontFor(segment, span.face);
    const last = runs.at(-1);
    if (last && last.fontPath === path) last.text += shown;
    else runs.push({ text: shown, fontPath: path });
  }
  return runs;
}
