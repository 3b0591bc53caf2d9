import { handout } from "@withy/clinical/programmes/handout";
import { emptyProgramme, newItems } from "@withy/clinical/programmes/new-item";
import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { describe, expect, it } from "vitest";
import { handoutPdf, type PrintedHandout } from "./handout-pdf";

let next = 0;
const items = [
  "sit-to-stand",
  "step-up",
  "bridge",
  "side-leg-lift",
  "heel-raise",
  "hip-hinge",
  "backward-leg-reach",
].flatMap((key) => newItems(key, "timed", () => `item-${++next}`));
const printed: PrintedHandout = {
  sender: {
    practice: "Marram Physiotherapy",
    siteLine: "Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA",
    contactLine: "01632 960110",
  },
  handout: handout(
    { ...emptyProgramme, items, advice: "Walk to the harbour and back on the other days." },
    "Eleri",
  ),
  patientName: "Eleri Tamworth",
  bornOn: "1958-03-02",
  author: { name: "Nia Prosser", jobTitle: "physiotherapist" },
  datedOn: "2026-12-01",
  versionNumber: 3,
  isDraft: false,
  at: new Date("2026-12-01T10:42:00Z"),
};

async function textOf(bytes: Buffer): Promise<string[]> {
  const pdf = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
  const pages = Array.from({ length: pdf.numPages }, (_, i) => pdf.getPage(i + 1));
  return Promise.all(
    pages.map(async (page) => {
      const { items: runs } = await (await page).getTextContent();
      return runs
        .map((run) => ("str" in run ? run.str : ""))
        .join("")
        .replace(/\s+/g, " ");
    }),
  );
}

describe("the printed handout", () => {
  it("holds the session's time, every exercise and the care words", async () => {
    const pages = await textOf(await handoutPdf(printed));
    const all = pages.join(" ");
    expect(all).toContain("Your exercises, Eleri");
    expect(all).toContain("Go round twice: 20 minutes.");
    for (const name of [
      "1 Sit to stand",
      "2 Step up, left then right",
      "4 Bridge",
      "9 Backward leg reach, left then right",
    ])
      expect(all).toContain(name);
    expect(all).toContain("Walk to the harbour and back");
    expect(all).toContain("If pain goes over 5 out of 10");
    expect(all).toContain("Nia Prosser, physiotherapist, 1 December 2026");
    expect(all).not.toContain("Draft");
  });

  it("is tagged, with a drawing described for each exercise, and the same bytes each time", async () => {
    const bytes = await handoutPdf(printed);
    const pdf = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
    expect((await pdf.getMarkInfo())?.Marked).toBe(true);
    const trees = [];
    for (let i = 1; i <= pdf.numPages; i += 1)
      trees.push(JSON.stringify(await (await pdf.getPage(i)).getStructTree()));
    expect(trees.join("").match(/"role":"Figure"/g)?.length).toBeGreaterThanOrEqual(7);
    expect(trees.join("")).toContain("Two line drawings of Bridge");
    expect(Buffer.compare(bytes, await handoutPdf(printed))).toBe(0);
  });

  it("says that a draft is one", async () => {
    const [first] = await textOf(await handoutPdf({ ...printed, isDraft: true }));
    expect(first).toContain("Draft. Not given to the patient yet.");
  });
});
