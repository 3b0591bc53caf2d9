import { ink, mm, page, textStyles } from "./page-style";
import type { Pdf } from "./pdf";
import { paragraph } from "./text";

export interface Sender {
  readonly practice: string;
  /** The site and its address in one line: "Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA". */
  readonly siteLine: string;
  /** Telephone and e-mail in one line. */
  readonly contactLine: string;
}

/** Practice, site and contacts at the left; reference and date at the right; a double rule under all. */
export function letterhead(pdf: Pdf, sender: Sender, rightLines: readonly string[]): void {
  const name = { ...textStyles.title, size: 18, leading: 23, color: ink.bottle };
  const left = pdf.column(pdf.x, pdf.width * 0.62, () => {
    paragraph(pdf, sender.practice, { style: name, after: 0 });
    paragraph(pdf, `${sender.siteLine}\n${sender.contactLine}`, { style: textStyles.small, after: 0 });
  });
  pdf.column(pdf.x + pdf.width * 0.64, pdf.width * 0.36, () => {
    pdf.space(name.leading);
    paragraph(pdf, rightLines.join("\n"), { style: textStyles.small, after: 0, align: "right" });
  });
  pdf.y = Math.max(left, pdf.y + name.leading + textStyles.small.leading * rightLines.length) + 5;
  pdf.pen.rule(pdf.y, { double: true });
  pdf.space(2);
}

/** Where the window of a DL envelope shows an A4 sheet folded in three: 20 mm in, 50 to 82 mm down (common practice). */
const addressWindow = { top: mm(50), bottom: mm(82), width: mm(85) };

/** The address in the envelope's window, and beside it what the letter is about. */
export function addressAndSubject(pdf: Pdf, address: readonly string[], subject: readonly string[]): void {
  pdf.y = Math.max(pdf.y + 6, addressWindow.top);
  const style = { ...textStyles.body, leading: 14.5 };
  const left = pdf.column(page.left, addressWindow.width, () =>
    paragraph(pdf, address.join("\n"), { style, after: 0 }),
  );
  const x = page.left + addressWindow.width + mm(6);
  const right = pdf.column(x, page.width - page.right - x, () => {
    const [first = "", ...rest] = subject;
    paragraph(pdf, [{ text: first, bold: true }, { text: rest.map((line) => `\n${line}`).join("") }], {
      style,
      after: 0,
    });
  });
  pdf.y = Math.max(left, right, addressWindow.bottom) + 4;
}
