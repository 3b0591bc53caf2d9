import { breakLines, type Line } from "./break-lines";
import type { Face } from "./faces";
import { ink, page, type TextStyle } from "./page-style";
import type { Run, Span } from "./runs";

/** Text for one paragraph or cell: plain, or a mix of plain and stressed stretches. */
export type Text = string | readonly TextPart[];

export interface TextPart {
  readonly text: string;
  readonly bold?: boolean;
  readonly italic?: boolean;
}

export type Align = "left" | "right" | "centre";

/** Draws lines of text and rules at places; knows nothing of structure or of the flow down the page. */
export class Pen {
  constructor(readonly doc: PDFKit.PDFDocument) {}

  private readonly measureAt =
    (style: TextStyle) =>
    (run: Run): number =>
      this.doc.font(run.fontPath, style.size).widthOfString(run.text, featuresOf(style));

  /** Breaks the text into lines of at most `width` points. */
  lines(text: Text, style: TextStyle, width: number, bold = false): Line[] {
    const parts = typeof text === "string" ? [{ text }] : text;
    const spans: Span[] = parts.map((part) => ({ text: part.text, face: faceOf(style, part, bold) }));
    return breakLines(spans, width, this.measureAt(style));
  }

  /** Draws one line in the box whose top left corner is (x, y) and whose width is `width`. */
  line(line: Line, style: TextStyle, x: number, y: number, width: number, align: Align = "left"): void {
    const spare = width - line.width;
    const from = x + (align === "right" ? spare : align === "centre" ? spare / 2 : 0);
    // Fonts in one line differ in ascent: all stand on one baseline, a little below the middle of the box.
    const baseline = y + style.leading / 2 + style.size * 0.34;
    for (const run of line.runs) {
      this.doc
        .font(run.fontPath, style.size)
        .fillColor(style.color)
        .text(run.text, from + run.x, baseline, {
          lineBreak: false,
          baseline: "alphabetic",
          ...featuresOf(style),
        });
    }
  }

  /** A horizontal line; decoration only, so that a screen reader passes over it. */
  rule(
    y: number,
    options: { x?: number; width?: number; color?: string; weight?: number; double?: boolean } = {},
  ): void {
    const {
      x = page.left,
      width = page.width - page.left - page.right,
      color = ink.text,
      weight = 0.7,
    } = options;
    this.decoration(() => {
      this.doc.lineWidth(weight).strokeColor(color);
      for (const at of options.double ? [y, y + 2.2] : [y])
        this.doc
          .moveTo(x, at)
          .lineTo(x + width, at)
          .stroke();
    });
  }

  /** Marks what is drawn as no part of the content. */
  decoration(draw: () => void, type: "Layout" | "Pagination" = "Layout"): void {
    this.doc.markContent("Artifact", { type });
    draw();
    this.doc.endMarkedContent();
  }
}

function faceOf(style: TextStyle, part: TextPart, bold: boolean): Face {
  if (style.face === "sans") return bold || part.bold ? "sans-bold" : "sans";
  if (bold || part.bold) return "serif-bold";
  return part.italic ? "serif-italic" : "serif";
}

/** Figures in tables and contact lines stand under each other: each is as wide as the next. */
function featuresOf(style: TextStyle): { features?: ["tnum"] } {
  return style.face === "sans" ? { features: ["tnum"] } : {};
}
