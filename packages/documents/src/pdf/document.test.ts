import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { describe, expect, it } from "vitest";
import { type Pdf, renderPdf } from "./document";
import { addressAndSubject, letterhead } from "./letterhead";
import { table } from "./table";
import { heading, list, paragraph } from "./text";

const at = new Date("2026-12-01T10:42:00Z");
const footer = { confidentiality: "Confidential.", reference: "Mrs E Tamworth" };
const render = (compose: (pdf: Pdf) => void) =>
  renderPdf({ title: "Discharge letter", author: "Marram Physiotherapy", at, footer }, compose);

interface Node {
  readonly role?: string;
  readonly children?: readonly Node[];
}
const rolesIn = (node: Node): string[] => [
  ...(node.role ? [node.role] : []),
  ...(node.children ?? []).flatMap(rolesIn),
];

async function read(bytes: Buffer) {
  const file = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
  const pages = await Promise.all(
    Array.from({ length: file.numPages }, async (_, i) => {
      const one = await file.getPage(i + 1);
      const items = (await one.getTextContent()).items.flatMap((item) => ("str" in item ? [item] : []));
      const roles = rolesIn(((await one.getStructTree()) ?? {}) as Node);
      return { text: items.map((item) => item.str).join(" "), items, roles };
    }),
  );
  return {
    pages,
    mark: await file.getMarkInfo(),
    info: (await file.getMetadata()).info as Record<string, unknown>,
  };
}

describe("a rendered document", () => {
  it("is tagged, titled, in British English, and the same bytes for the same content", async () => {
    const compose = (pdf: Pdf) => {
      heading(pdf, 1, "Discharge from physiotherapy");
      paragraph(pdf, "Dear Dr Pryor");
      list(pdf, ["One", "Two"]);
    };
    const bytes = await render(compose);
    const { pages, mark, info } = await read(bytes);
    expect(mark?.Marked).toBe(true);
    expect(info.Title).toBe("Discharge letter");
    expect(info.Language).toBe("en-GB");
    expect(pages[0]?.roles).toEqual(expect.arrayContaining(["H1", "P", "L", "LI", "Lbl", "LBody"]));
    expect((await render(compose)).equals(bytes)).toBe(true);
  });

  it.each([
    "Łucja Żółć-Kowalska",
    "Nguyễn Thị Hường",
    "Αλεξάνδρα Παπαδοπούλου",
    "Юлія Щербаківська",
    "Ђорђе Јовановић",
    "Ștefan Țăranu",
    "Oğuz Şimşek İnan",
    "Þórður Ægisson",
    "Siân Ŵyn O’Neill",
  ])("prints %s in every face, and its letters can be read back", async (name) => {
    const { pages } = await read(
      await render((pdf) => {
        paragraph(pdf, name);
        paragraph(pdf, [{ text: name, bold: true }]);
        paragraph(pdf, [{ text: name, italic: true }]);
        table(pdf, { columns: [{ head: name, share: 1 }], rows: [{ cells: [name] }] });
      }),
    );
    const text = (pages[0]?.text ?? "").normalize("NFC").replaceAll(" ", "");
    expect(text.split(name.normalize("NFC").replaceAll(" ", "")).length - 1).toBe(5);
  });

  it("shows that a character is missing where no font has it, and drops control characters", async () => {
    const { pages } = await read(await render((pdf) => paragraph(pdf, "Tanaka 田\u0007\u200B end")));
    expect(pages[0]?.text.replaceAll(/\s+/g, " ")).toContain("Tanaka \uFFFD end");
  });

  it("keeps every line within the margins, even one word longer than the page", async () => {
    const long = `a.very.long.address.${"x".repeat(300)}@marram.example`;
    const { pages } = await read(await render((pdf) => paragraph(pdf, long)));
    for (const item of pages[0]?.items ?? []) {
      expect((item.transform[4] as number) + item.width).toBeLessThanOrEqual(595.28 - 56);
    }
    expect(
      (pages[0]?.items ?? [])
        .map((item) => item.str)
        .join("")
        .replaceAll(/\s/g, ""),
    ).toContain(long);
  });

  it("numbers its pages, repeats a table's heads for the eye, and tags them once", async () => {
    const rows = Array.from({ length: 60 }, (_, i) => ({ cells: [`Visit ${i + 1}`, "£62.00"] }));
    const { pages } = await read(
      await render((pdf) =>
        table(pdf, {
          columns: [
            { head: "Service", share: 3 },
            { head: "Amount", share: 1, align: "right" },
          ],
          rows: [...rows, { cells: ["Total", "£3,720.00"], kind: "total" }],
          rowHeads: true,
        }),
      ),
    );
    expect(pages.length).toBe(2);
    for (const [i, one] of pages.entries()) {
      expect(one.text).toContain(`Page ${i + 1} of 2`);
      expect(one.text).toContain("Service");
      expect(one.text).toContain("Mrs E Tamworth");
    }
    const all = pages.map((one) => one.text).join(" ");
    for (const row of rows) expect(all).toContain(row.cells[0]);
    // The reader gives the whole table's structure with each page that shows a part of it.
    for (const one of pages) expect(one.roles.filter((role) => role === "TH").length).toBe(2 + 61);
  });

  it("carries a row taller than a page over to the next without losing a word", async () => {
    const words = Array.from({ length: 2500 }, (_, i) => `word${i}`);
    const { pages } = await read(
      await render((pdf) =>
        table(pdf, { columns: [{ head: "Note", share: 1 }], rows: [{ cells: [words.join(" ")] }] }),
      ),
    );
    const all = pages.map((one) => one.text).join(" ");
    expect(words.filter((word) => !all.includes(word))).toEqual([]);
  });

  it("puts the address where the window of a folded letter shows it", async () => {
    const { pages } = await read(
      await render((pdf) => {
        const sender = {
          practice: "Marram Physiotherapy",
          siteLine: "Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA",
          contactLine: "01632 960 110",
        };
        letterhead(pdf, sender, ["Tuesday 1 December 2026"]);
        addressAndSubject(
          pdf,
          ["Dr Hanne Pryor", "Quayside Surgery", "2 Lamp Lane", "Easterhaven", "ZZ4 1AB"],
          ["Mrs Eleri Tamworth"],
        );
      }),
    );
    const address = (pages[0]?.items ?? []).filter((item) => /Pryor|ZZ4 1AB/.test(item.str));
    for (const item of address) {
      const fromTop = 297 - ((item.transform[5] as number) * 25.4) / 72;
      expect(fromTop).toBeGreaterThan(50);
      expect(fromTop).toBeLessThan(84);
    }
    expect(address.length).toBe(2);
  });
});
