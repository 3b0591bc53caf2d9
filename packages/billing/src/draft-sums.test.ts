import { sumPence } from "@withy/core/money";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type DraftLine, draftSums } from "./draft-sums";
import { type VatRoundingCode, vatRoundings } from "./invoice-totals";
import { vatTreatments } from "./vat";

const visit: DraftLine = { quantity: 1, unitPence: 5200, discountBasisPoints: 0, vatTreatment: "exempt" };
const band: DraftLine = { quantity: 2, unitPence: 1250, discountBasisPoints: 0, vatTreatment: "standard" };
const practice = { vatNumber: "GB 999 0012 34", vatRounding: "line-nearest" as const };

describe("a draft's sums", () => {
  it("stand on each line with the rate that it bears", () => {
    const { lines, totals } = draftSums([{ ...visit, discountBasisPoints: 1000 }, band], practice);
    expect(lines).toEqual([
      { vatBasisPoints: 0, netPence: 4680, vatPence: 0, totalPence: 4680 },
      { vatBasisPoints: 2000, netPence: 2500, vatPence: 500, totalPence: 3000 },
    ]);
    expect(totals).toMatchObject({ netPence: 7180, vatPence: 500, grossPence: 7680, discountPence: 520 });
  });

  it("bear neither VAT nor a rate where the practice is not registered", () => {
    const { lines } = draftSums([band], { ...practice, vatNumber: null });
    expect(lines).toEqual([{ vatBasisPoints: 0, netPence: 2500, vatPence: 0, totalPence: 2500 }]);
  });

  it("of no lines are nothing", () => {
    expect(draftSums([], practice)).toMatchObject({ lines: [], totals: { grossPence: 0 } });
  });

  it("add up to the totals, whatever the lines and the rounding", () => {
    const line = fc.record({
      quantity: fc.integer({ min: 1, max: 99 }),
      unitPence: fc.integer({ min: 0, max: 50_000 }),
      discountBasisPoints: fc.integer({ min: 0, max: 10_000 }),
      vatTreatment: fc.constantFrom(...vatTreatments),
    });
    const rounding = fc.constantFrom(...(Object.keys(vatRoundings) as VatRoundingCode[]));
    fc.assert(
      fc.property(fc.array(line, { maxLength: 12 }), rounding, (lines, vatRounding) => {
        const sums = draftSums(lines, { ...practice, vatRounding });
        expect(sumPence(sums.lines.map((l) => l.netPence))).toBe(sums.totals.netPence);
        expect(sumPence(sums.lines.map((l) => l.vatPence))).toBe(sums.totals.vatPence);
        expect(sumPence(sums.lines.map((l) => l.totalPence))).toBe(sums.totals.grossPence);
        for (const l of sums.lines) expect(l.netPence + l.vatPence).toBe(l.totalPence);
      }),
    );
  });
});
