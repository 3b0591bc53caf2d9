import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { describe, expect, it } from "vitest";
import { assembleDischargeLetter } from "./assemble-discharge-letter";
import { type PrintedLetter, renderLetterPdf } from "./letter-pdf";
import { hipFacts } from "./scenario.test-data";

const letter: PrintedLetter = {
  sender: {
    practice: "Marram Physiotherapy",
    siteLine: "Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA",
    contactLine: "01632 960 110, letters@marram.example",
  },
  title: "Discharge from physiotherapy",
  reference: "ET-0613",
  datedOn: "2026-12-01",
  recipient: {
    name: "Dr Hanne Pryor",
    addressLines: ["Quayside Surgery", "2 Lamp Lane", "Easterhaven", "ZZ4 1AB"],
  },
  patient: {
    name: "Eleri Tamworth",
    bornOn: "1963-06-22",
    nhsNumber: "9993142786",
    addressLines: ["9 Kelp Street", "Easterhaven ZZ4 6RN"],
  },
  sections: assembleDischargeLetter(hipFacts),
  author: { name: "Nia Prosser", jobTitle: "physiotherapist", registrationNumber: "PH100201" },
  signedOn: "2026-12-01",
  copies: ["Eleri Tamworth"],
  at: new Date("2026-12-01T10:42:00Z"),
};

async function textOf(bytes: Buffer): Promise<string> {
  const file = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
  const pages = await Promise.all(
    Array.from({ length: file.numPages }, async (_, i) => {
      const { items } = await (await file.getPage(i + 1)).getTextContent();
      return items.map((item) => ("str" in item ? item.str : "")).join(" ");
    }),
  );
  return pages.join(" ").replaceAll(/\s+/g, " ");
}

describe("the printed letter", () => {
  it("prints who, about whom, every heading and sentence, and who signed", async () => {
    const text = await textOf(await renderLetterPdf(letter));
    const said = letter.sections.flatMap((section) => [
      section.heading,
      ...section.sentences.map((s) => s.text),
    ]);
    for (const words of [
      ...said,
      "Dear Dr Hanne Pryor",
      "ZZ4 1AB",
      "NHS number 999 314 2786",
      "Born 22 June 1963",
    ]) {
      expect(text).toContain(words);
    }
    expect(text).toContain("Signed electronically on Tuesday 1 December 2026");
    expect(text).toContain("Nia Prosser , physiotherapist, HCPC PH100201");
    expect(
      text.match(/NHS number 999 314 2786/g)?.length,
      "beside the address and at the foot of both pages",
    ).toBe(3);
    expect(text).not.toContain("Draft");
    expect(text).not.toContain("Note, 1 Dec");
  });

  it("says that a draft is a draft", async () => {
    const text = await textOf(await renderLetterPdf({ ...letter, signedOn: null }));
    expect(text).toContain("Draft. Not signed, and not to be sent.");
    expect(text).not.toContain("Signed electronically");
  });

  it("leaves out a sentence whose text was taken away, and a heading with nothing under it", async () => {
    const sections = letter.sections.map((section) =>
      section.key === "allergies"
        ? { ...section, sentences: section.sentences.map((s) => ({ ...s, text: "" })) }
        : section,
    );
    expect(await textOf(await renderLetterPdf({ ...letter, sections }))).not.toContain("Allergies");
  });
});
