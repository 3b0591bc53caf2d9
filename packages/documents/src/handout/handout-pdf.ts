import { drawMovement, drawStart } from "@withy/clinical/exercises/draw-figure";
import type { Handout, HandoutEntry } from "@withy/clinical/programmes/handout";
import { longDate, plainDateWords } from "@withy/core/date-words";
import type { PlainDateText } from "@withy/core/zoned-time";
import { type Pdf, renderPdf } from "../pdf/document";
import { letterhead, type Sender } from "../pdf/letterhead";
import { ink, textStyles } from "../pdf/page-style";
import type { Text } from "../pdf/pen";
import { figure, heading, paragraph } from "../pdf/text";
import { drawExercise } from "./draw-exercise";

export interface PrintedHandout {
  readonly sender: Sender;
  readonly handout: Handout;
  readonly patientName: string;
  readonly bornOn: PlainDateText;
  readonly author: { readonly name: string; readonly jobTitle: string };
  readonly datedOn: PlainDateText;
  readonly versionNumber: number;
  /** Never given out: the paper says so. */
  readonly isDraft: boolean;
  /** Written into the file; the same handout at the same instant gives the same bytes. */
  readonly at: Date;
}

const figureSize = 82;
const figureGap = 4;
const textLeft = figureSize * 2 + figureGap + 16;

const title = { ...textStyles.heading, face: "serif", size: 12.5, leading: 18, color: ink.text } as const;
const body = { ...textStyles.body, size: 10.5, leading: 14.5 } as const;
const small = textStyles.small;

/** The lines of one exercise in the order they are read, each with its style. */
function entryLines(entry: HandoutEntry): { text: Text; style: typeof body | typeof small; after: number }[] {
  const labelled = (label: string, text: string): Text => [{ text: `${label} `, bold: true }, { text }];
  const lines = [
    { text: [{ text: entry.formName, italic: true }], style: { ...body, color: ink.soft }, after: 2 },
    { text: entry.start, style: body, after: 1 },
    { text: [...entry.steps, entry.how].join(" "), style: body, after: 3 },
    { text: labelled("How much:", entry.dose), style: body, after: 0 },
    ...(entry.hold === null ? [] : [{ text: labelled("Support:", entry.hold), style: body, after: 0 }]),
    ...(entry.needs === null
      ? []
      : [{ text: labelled("You need:", `${entry.needs}.`), style: body, after: 0 }]),
    ...(entry.note === "" ? [] : [{ text: labelled("For you:", entry.note), style: body, after: 0 }]),
    { text: `Take care. ${entry.cautions.join(" ")}`, style: small, after: 0 },
  ];
  return lines as { text: Text; style: typeof body | typeof small; after: number }[];
}

function heightOf(pdf: Pdf, entry: HandoutEntry): number {
  const width = pdf.width - textLeft;
  const text = entryLines(entry).reduce(
    (sum, line) => sum + pdf.pen.lines(line.text, line.style, width).length * line.style.leading + line.after,
    pdf.pen.lines(entry.title, title, width, true).length * title.leading,
  );
  return Math.max(text, figureSize) + 16;
}

function altOf(entry: HandoutEntry): string {
  return `Two line drawings of ${entry.title}: the starting position, and the movement over the dotted start.`;
}

/** Drawings at the left, words at the right; an exercise is never cut by the end of a page. */
function drawEntry(pdf: Pdf, entry: HandoutEntry): void {
  pdf.need(heightOf(pdf, entry));
  pdf.pen.rule(pdf.y, { color: ink.hair });
  pdf.space(8);
  pdf.element("Sect", () => {
    const size = { width: figureSize * 2 + figureGap, height: figureSize };
    const words = pdf.column(pdf.x + textLeft, pdf.width - textLeft, () => {
      pdf.element("H2", () => pdf.flow(`${entry.number} ${entry.title}`, title, { bold: true }));
      for (const { text, style, after } of entryLines(entry)) paragraph(pdf, text, { style, after });
    });
    const drawings = pdf.column(pdf.x, size.width, () =>
      figure(pdf, { alt: altOf(entry), ...size }, (doc, x, y) => {
        drawExercise(doc, drawStart(entry.figure), x, y, figureSize);
        drawExercise(doc, drawMovement(entry.figure), x + figureSize + figureGap, y, figureSize);
      }),
    );
    pdf.y = Math.max(words, drawings) + 8;
  });
}

function drawCare(pdf: Pdf, { handout, author, datedOn }: PrintedHandout): void {
  const care: Text = [{ text: `${handout.careTitle} `, bold: true }, { text: handout.care }];
  const lines = pdf.pen.lines(care, textStyles.body, pdf.width).length;
  pdf.need(lines * textStyles.body.leading + textStyles.small.leading + 24);
  pdf.pen.rule(pdf.y);
  pdf.space(8);
  pdf.element("Sect", () => {
    if (handout.advice !== "") paragraph(pdf, handout.advice, { after: 6 });
    paragraph(pdf, care, { after: 6 });
    paragraph(pdf, `${author.name}, ${author.jobTitle}, ${plainDateWords(datedOn)}`, {
      style: textStyles.small,
    });
  });
}

/** The home exercise handout: A4, tagged, fonts embedded, every exercise drawn. */
export function handoutPdf(printed: PrintedHandout): Promise<Buffer> {
  const { handout, sender } = printed;
  const reference = `${printed.patientName}, born ${plainDateWords(printed.bornOn)}, version ${printed.versionNumber}`;
  const options = {
    title: `Home exercises, ${printed.patientName}`,
    author: sender.practice,
    at: printed.at,
    footer: { reference, confidentiality: "" },
  };
  return renderPdf(options, (pdf) => {
    letterhead(pdf, sender, [longDate(printed.datedOn)]);
    if (printed.isDraft) {
      const style = { ...textStyles.heading, color: ink.danger };
      paragraph(pdf, "Draft. Not given to the patient yet.", { style, bold: true });
    }
    heading(pdf, 1, handout.title);
    paragraph(pdf, handout.summary, { after: 8 });
    for (const entry of handout.entries) drawEntry(pdf, entry);
    drawCare(pdf, printed);
  });
}
