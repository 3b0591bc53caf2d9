import type { LetterActor, LetterSection } from "@withy/contracts/letters";
import { longDate, plainDateWords } from "@withy/core/date-words";
import { formatNhsNumber } from "@withy/core/identifiers/nhs-number";
import type { PlainDateText } from "@withy/core/zoned-time";
import { type Pdf, renderPdf } from "../pdf/document";
import { addressAndSubject, letterhead, type Sender } from "../pdf/letterhead";
import { ink, textStyles } from "../pdf/page-style";
import { table } from "../pdf/table";
import { heading, paragraph } from "../pdf/text";

export interface PrintedLetter {
  readonly sender: Sender;
  readonly title: string;
  readonly reference: string;
  readonly datedOn: PlainDateText;
  readonly recipient: { readonly name: string; readonly addressLines: readonly string[] };
  readonly patient: {
    readonly name: string;
    readonly bornOn: PlainDateText;
    readonly nhsNumber: string | null;
    readonly addressLines: readonly string[];
  };
  readonly sections: readonly LetterSection[];
  readonly author: {
    readonly name: string;
    readonly jobTitle: string;
    readonly registrationNumber: string | null;
  };
  /** Null prints a draft that says so. */
  readonly signedOn: PlainDateText | null;
  /** Who else gets it, for example "Eleri Tamworth". */
  readonly copies: readonly string[];
  /** Written into the file; the same letter at the same instant gives the same bytes. */
  readonly at: Date;
}

const actorWords: Record<LetterActor, string> = { gp: "GP", patient: "Patient", practice: "Us" };

function subjectLines({ patient }: PrintedLetter): string[] {
  return [
    patient.name,
    `Born ${plainDateWords(patient.bornOn)}`,
    ...(patient.nhsNumber ? [`NHS number ${formatNhsNumber(patient.nhsNumber)}`] : []),
    ...patient.addressLines,
  ];
}

function drawActions(pdf: Pdf, section: LetterSection): void {
  const rows = section.sentences
    .filter((sentence) => sentence.text !== "")
    .map((sentence) => ({ cells: [sentence.actor ? actorWords[sentence.actor] : "", sentence.text] }));
  const style = { ...textStyles.body, leading: 15.5 };
  table(pdf, {
    columns: [
      { head: "For", share: 1.5 },
      { head: "Action", share: 8 },
    ],
    rows,
    rowHeads: true,
    style,
  });
}

function drawSection(pdf: Pdf, section: LetterSection): void {
  const said = section.sentences.filter((sentence) => sentence.text !== "");
  if (said.length === 0) return;
  pdf.element("Sect", () => {
    heading(pdf, 2, section.heading);
    if (section.key === "plan") drawActions(pdf, section);
    else for (const sentence of said) paragraph(pdf, sentence.text, { after: 1.5 });
  });
}

function drawSignature(pdf: Pdf, letter: PrintedLetter): void {
  const { author, signedOn, copies } = letter;
  pdf.need(textStyles.body.leading * 6);
  pdf.space(8);
  paragraph(pdf, "Yours sincerely", { after: 10 });
  const mark = signedOn ? `Signed electronically on ${longDate(signedOn)}` : "Not signed";
  paragraph(pdf, [{ text: mark, italic: true }], { style: { ...textStyles.body, color: ink.soft } });
  const number = author.registrationNumber ? `, HCPC ${author.registrationNumber}` : "";
  paragraph(pdf, [{ text: author.name, bold: true }, { text: `, ${author.jobTitle}${number}` }]);
  if (copies.length > 0) paragraph(pdf, `Copy to ${copies.join(", ")}`, { style: textStyles.small });
}

/** The letter as its reader gets it: the site's letterhead, the address in the envelope's window, tagged headings. */
export function renderLetterPdf(letter: PrintedLetter): Promise<Buffer> {
  const { patient, sender } = letter;
  const nhs = patient.nhsNumber ? `, NHS number ${formatNhsNumber(patient.nhsNumber)}` : "";
  const footer = {
    reference: `${patient.name}, born ${plainDateWords(patient.bornOn)}${nhs}`,
    confidentiality: `Confidential health information for the person it is addressed to. If it reached you by mistake, tell ${sender.practice} and delete it.`,
  };
  const options = {
    title: `${letter.title}, ${patient.name}`,
    author: sender.practice,
    at: letter.at,
    footer,
  };
  return renderPdf(options, (pdf) => {
    letterhead(pdf, sender, [`Our reference ${letter.reference}`, longDate(letter.datedOn)]);
    addressAndSubject(pdf, [letter.recipient.name, ...letter.recipient.addressLines], subjectLines(letter));
    if (!letter.signedOn) {
      const style = { ...textStyles.heading, color: ink.danger };
      paragraph(pdf, "Draft. Not signed, and not to be sent.", { style, bold: true });
    }
    heading(pdf, 1, letter.title);
    paragraph(pdf, `Dear ${letter.recipient.name}`);
    for (const section of letter.sections) drawSection(pdf, section);
    drawSignature(pdf, letter);
  });
}
