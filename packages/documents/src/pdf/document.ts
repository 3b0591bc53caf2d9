import PDFDocument from "pdfkit";
import { fontsOf } from "./faces";
import { drawFooters, type Footer } from "./footer";
import { Pdf } from "./pdf";

export type { Pdf } from "./pdf";

export interface PdfOptions {
  readonly title: string;
  readonly author: string;
  /** Written into the file. The same content with the same instant gives the same bytes. */
  readonly at: Date;
  readonly footer: Footer;
}

/**
 * Renders a document to bytes: PDF 1.7, tagged for accessibility (PDF/UA), British English, every font embedded.
 * @param compose draws the content from top to bottom
 */
export async function renderPdf(options: PdfOptions, compose: (pdf: Pdf) => void): Promise<Buffer> {
  const doc = new PDFDocument({
    font: fontsOf("sans")[0]?.path,
    size: "A4",
    margin: 0,
    subset: "PDF/UA",
    pdfVersion: "1.7",
    tagged: true,
    lang: "en-GB",
    displayTitle: true,
    bufferPages: true,
    info: {
      Title: options.title,
      Author: options.author,
      Creator: "Withy",
      Producer: "Withy",
      CreationDate: options.at,
      ModDate: options.at,
    },
  } as unknown as PDFKit.PDFDocumentOptions);
  const chunks: Buffer[] = [];
  const done = new Promise<Buffer>((resolve, reject) => {
    doc.on("data", (chunk: Buffer) => chunks.push(chunk));
    doc.on("end", () => resolve(Buffer.concat(chunks)));
    doc.on("error", reject);
  });
  const pdf = new Pdf(doc);
  compose(pdf);
  drawFooters(pdf, options.footer);
  doc.end();
  return done;
}
