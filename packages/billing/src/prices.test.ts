import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { choosePrice, type Price } from "./prices";

const price = (id: string, more: Partial<Price> = {}): Price => ({
  id,
  itemId: "follow-up",
  siteId: null,
  payerId: null,
  validFrom: "2026-01-01",
  validUntil: null,
  amountPence: 6200,
  vatTreatment: "exempt",
  ...more,
});

const wish = { itemId: "follow-up", siteId: "saltgate", payerId: "samphire", on: "2026-11-10" };

describe("choosing a price", () => {
  const list = [
    price("general"),
    price("site", { siteId: "saltgate" }),
    price("payer", { payerId: "samphire" }),
    price("payer at site", { payerId: "samphire", siteId: "saltgate" }),
    price("elsewhere", { siteId: "tollhouse" }),
    price("other service", { itemId: "initial", payerId: "samphire", siteId: "saltgate" }),
  ];

  it.each([
    [wish, "payer at site"],
    [{ ...wish, siteId: "wharf" }, "payer"],
    [{ ...wish, payerId: null }, "site"],
    [{ ...wish, payerId: "halyard", siteId: "wharf" }, "general"],
    [{ ...wish, itemId: "massage" }, null],
  ])("%o takes %s", (asked, id) => {
    expect(choosePrice(list, asked)?.id ?? null).toBe(id);
  });

  it("takes the price of the day, its last day included", () => {
    const rise = [price("old", { validUntil: "2026-11-10" }), price("new", { validFrom: "2026-11-11" })];
    expect(choosePrice(rise, wish)?.id).toBe("old");
    expect(choosePrice(rise, { ...wish, on: "2026-11-11" })?.id).toBe("new");
    expect(choosePrice(rise, { ...wish, on: "2025-12-31" })).toBeNull();
  });

  it("takes the one that began last where two overlap", () => {
    const overlap = [price("old"), price("new", { validFrom: "2026-06-01" })];
    expect(choosePrice(overlap, wish)?.id).toBe("new");
  });

  it("does not depend on the order of the list", () => {
    fc.assert(
      fc.property(fc.shuffledSubarray(list, { minLength: list.length }), (shuffled) => {
        expect(choosePrice(shuffled, wish)?.id).toBe("payer at site");
      }),
    );
  });
});
