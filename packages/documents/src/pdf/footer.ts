import { ink, page, textStyles } from "./page-style";
import type { Pdf } from "./pdf";

export interface Footer {
  /** Who may read it, for example "Confidential: for the person it is addressed to". Empty for none. */
  readonly confidentiality: string;
  /** What each page belongs to if it is found alone, for example "Mrs E Tamworth, NHS 999 314 2786". */
  readonly reference: string;
}

/** "Page 2 of 3" and the footer's lines on every page, once all pages are there to be counted. */
export function drawFooters(pdf: Pdf, footer: Footer): void {
  const { start, count } = pdf.doc.bufferedPageRange();
  const y = page.height - page.bottom + 18;
  const width = page.width - page.left - page.right;
  const style = textStyles.small;
  for (let index = start; index < start + count; index += 1) {
    pdf.doc.switchToPage(index);
    pdf.pen.rule(y - 5, { color: ink.rule, weight: 0.5 });
    pdf.pen.decoration(() => {
      const right = pdf.pen.lines(`Page ${index - start + 1} of ${count}`, style, width * 0.2)[0];
      if (right) pdf.pen.line(right, style, page.left + width * 0.8, y, width * 0.2, "right");
      // Never cut short: half of an identifier is worse than none.
      const reference = pdf.pen.lines(footer.reference, style, width * 0.8);
      const notice = pdf.pen.lines(footer.confidentiality, style, width);
      for (const [row, line] of [...reference, ...notice].entries()) {
        pdf.pen.line(line, style, page.left, y + style.leading * row, width);
      }
    }, "Pagination");
  }
}
