import { type TextStyle, textStyles } from "./page-style";
import type { Pdf } from "./pdf";
import type { Align, Text } from "./pen";

/** The document's title (level 1) or a heading below it, kept together with at least two lines of what follows. */
export function heading(pdf: Pdf, level: 1 | 2 | 3, text: string): void {
  const style = level === 1 ? textStyles.title : textStyles.heading;
  pdf.need(style.leading + textStyles.body.leading * 2 + 8);
  pdf.space(level === 1 ? 6 : 9);
  pdf.element(`H${level}`, () => pdf.flow(text, style, { bold: level !== 1 }));
  pdf.space(level === 1 ? 6 : 1);
}

export function paragraph(
  pdf: Pdf,
  text: Text,
  options: { style?: TextStyle; after?: number; bold?: boolean; align?: Align } = {},
): void {
  const { style = textStyles.body, after = 3, bold = false, align = "left" } = options;
  pdf.element("P", () => pdf.flow(text, style, { bold, align }));
  pdf.space(after);
}

/** A list, numbered or with dashes. */
export function list(
  pdf: Pdf,
  items: readonly Text[],
  options: { style?: TextStyle; numbered?: boolean } = {},
): void {
  const { style = textStyles.body, numbered = false } = options;
  const indent = style.size * (numbered ? 1.9 : 1.3);
  pdf.element("L", () => {
    for (const [index, item] of items.entries()) {
      pdf.need(style.leading);
      pdf.element("LI", () => {
        const label = pdf.pen.lines(numbered ? `${index + 1}.` : "–", style, indent)[0];
        if (label) pdf.element("Lbl", () => pdf.mark(() => pdf.pen.line(label, style, pdf.x, pdf.y, indent)));
        const y = pdf.column(pdf.x + indent, pdf.width - indent, () =>
          pdf.element("LBody", () => pdf.flow(item, style)),
        );
        pdf.y = y;
      });
      pdf.space(2);
    }
  });
}

/** A drawing with the words that stand for it. `draw` is given the top left corner. */
export function figure(
  pdf: Pdf,
  options: { alt: string; width: number; height: number },
  draw: (doc: PDFKit.PDFDocument, x: number, y: number) => void,
): void {
  pdf.need(options.height);
  const { x, y } = pdf;
  pdf.element("Figure", () => pdf.mark(() => draw(pdf.doc, x, y)), {
    alt: options.alt,
    bbox: [x, y, x + options.width, y + options.height],
    placement: "Block",
  });
  pdf.space(options.height);
}
