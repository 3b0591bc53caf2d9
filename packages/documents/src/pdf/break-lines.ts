import { type Run, runsOf, type Span } from "./runs";

/** Measures a run in points at the size in question. */
export type Measure = (run: Run) => number;

export interface PlacedRun extends Run {
  /** Points from the left edge of the line. */
  readonly x: number;
  readonly width: number;
}

export interface Line {
  readonly runs: readonly PlacedRun[];
  /** Points, without the space that ends the line. */
  readonly width: number;
}

interface Piece {
  readonly runs: readonly Run[];
  readonly width: number;
  readonly isSpace: boolean;
}

const graphemes = new Intl.Segmenter("en-GB", { granularity: "grapheme" });
// A no-break space (U+00A0) is no place to break, so the pattern names the plain space and tab alone.
const spaces = /([ \t]+)/;

function piecesOf(spans: readonly Span[], measure: Measure): Piece[] {
  return spans.flatMap((span) =>
    span.text
      .split(spaces)
      .filter((text) => text !== "")
      .map((text) => {
        const isSpace = /^[ \t]+$/.test(text);
        const runs = runsOf({ text: isSpace ? " " : text, face: span.face });
        return { runs, width: runs.reduce((sum, run) => sum + measure(run), 0), isSpace };
      }),
  );
}

/** Words are the pieces between spaces, even where the face changes inside one, as in "(bold)". */
function wordsOf(pieces: readonly Piece[]): Piece[] {
  const words: Piece[] = [];
  for (const piece of pieces) {
    const last = words.at(-1);
    if (last && !last.isSpace && !piece.isSpace) {
      words[words.length - 1] = {
        runs: [...last.runs, ...piece.runs],
        width: last.width + piece.width,
        isSpace: false,
      };
    } else if (!(last?.isSpace && piece.isSpace)) words.push(piece);
  }
  return words;
}

/** Cuts a word that is wider than the line (an address, a long code) between letters. */
function cutWord(word: Piece, width: number, measure: Measure): Piece[] {
  const cut: Piece[] = [];
  let runs: Run[] = [];
  let used = 0;
  for (const run of word.runs) {
    for (const { segment } of graphemes.segment(run.text)) {
      const one = { text: segment, fontPath: run.fontPath };
      const w = measure(one);
      if (used + w > width && runs.length > 0) {
        cut.push({ runs, width: used, isSpace: false });
        runs = [];
        used = 0;
      }
      runs.push(one);
      used += w;
    }
  }
  return runs.length > 0 ? [...cut, { runs, width: used, isSpace: false }] : cut;
}

function placed(pieces: readonly Piece[], measure: Measure): Line {
  const joined: { text: string; fontPath: string }[] = [];
  for (const run of pieces.flatMap((piece) => piece.runs)) {
    const last = joined.at(-1);
    if (last && last.fontPath === run.fontPath) last.text += run.text;
    else joined.push({ ...run });
  }
  let x = 0;
  const runs = joined.map((run) => {
    const width = measure(run);
    const at = { ...run, x, width };
    x += width;
    return at;
  });
  return { runs, width: x };
}

function breakParagraph(spans: readonly Span[], width: number, measure: Measure): Line[] {
  const words = wordsOf(piecesOf(spans, measure)).flatMap((word) =>
    word.width > width && !word.isSpace ? cutWord(word, width, measure) : [word],
  );
  const lines: Line[] = [];
  let line: Piece[] = [];
  let used = 0;
  const close = () => {
    while (line.at(-1)?.isSpace) line.pop();
    lines.push(placed(line, measure));
    line = [];
    used = 0;
  };
  for (const word of words) {
    if (!word.isSpace && used + word.width > width && line.length > 0) close();
    if (word.isSpace && line.length === 0) continue;
    line.push(word);
    used += word.width;
  }
  close();
  return lines;
}

/** Breaks text into lines no wider than `width` points; a newline in the text always breaks. */
export function breakLines(spans: readonly Span[], width: number, measure: Measure): Line[] {
  const paragraphs: Span[][] = [[]];
  for (const span of spans) {
    const parts = span.text.split(/\r\n|\r|\n/);
    for (const [index, text] of parts.entries()) {
      if (index > 0) paragraphs.push([]);
      paragraphs.at(-1)?.push({ text, face: span.face });
    }
  }
  return paragraphs.flatMap((paragraph) => breakParagraph(paragraph, width, measure));
}
