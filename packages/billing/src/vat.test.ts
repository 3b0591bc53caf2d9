import { describe, expect, it } from "vitest";
import { splitGross, vatNote, vatOnNet, vatTenthsDown } from "./vat";
import { supplies, usualVatLiability } from "./vat-liability";

describe("VAT of an amount", () => {
  it("keeps the exact VAT as a fraction", () => {
    expect(vatOnNet(1799, "standard")).toEqual({ numerator: 3_598_000n, denominator: 10_000n });
    expect(vatOnNet(6500, "exempt").numerator).toBe(0n);
  });

  it("takes a shelf price apart without losing a penny", () => {
    expect(splitGross(999, "standard")).toEqual({ netPence: 832, vatPence: 167 });
    expect(splitGross(6500, "exempt")).toEqual({ netPence: 6500, vatPence: 0 });
  });

  it("rounds a line down to a tenth of a penny", () => {
    expect(vatTenthsDown(3333, "standard")).toBe(6666);
    expect(vatTenthsDown(12, "standard")).toBe(24);
    expect(vatTenthsDown(1, "standard")).toBe(2);
  });
});

describe("the VAT note of an invoice", () => {
  const totals = [
    { treatment: "standard", netPence: 1000, vatPence: 200 },
    { treatment: "exempt", netPence: 18600, vatPence: 0 },
  ] as const;

  it("prints reason, registration and the sum charged", () => {
    expect(vatNote(totals, { vatNumber: "GB 000 0000 00" })).toEqual([
      "Care by a registered health professional is exempt.",
      "VAT registration GB 000 0000 00.",
      "£10.00 at 20% is £2.00.",
    ]);
  });

  it("says nothing of VAT where the practice is not registered", () => {
    expect(vatNote(totals, { vatNumber: null })).toEqual([]);
  });
});

describe("usual liability", () => {
  it("names a source for every supply", () => {
    for (const supply of supplies) expect(usualVatLiability(supply).source).not.toBe("");
  });

  it("exempts a bandage used in treatment but taxes a band that is sold", () => {
    expect(usualVatLiability("consumable-in-treatment").treatment).toBe("exempt");
    expect(usualVatLiability("goods").treatment).toBe("standard");
  });

  it("asks for an adviser where facts decide", () => {
    expect(usualVatLiability("occupational-health").needsAdviser).toBe(true);
    expect(usualVatLiability("treatment").needsAdviser).toBe(false);
  });
});
