import { sumPence } from "@withy/core/money";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { allocateOldestFirst, type Debt } from "./allocation";

const debt = (id: string, dueOn: string, owedPence: number): Debt => ({ id, dueOn, number: id, owedPence });
const debts = [debt("c", "2026-11-24", 18600), debt("a", "2026-08-19", 12400), debt("b", "2026-10-02", 6200)];

describe("oldest debt first", () => {
  it.each([
    [0, [], 0],
    [5000, [["a", 5000]], 0],
    [
      15000,
      [
        ["a", 12400],
        ["b", 2600],
      ],
      0,
    ],
    [
      40000,
      [
        ["a", 12400],
        ["b", 6200],
        ["c", 18600],
      ],
      2800,
    ],
  ] as const)("%i pence", (amount, parts, leftPence) => {
    expect(allocateOldestFirst(amount, debts)).toEqual({
      parts: parts.map(([id, amountPence]) => ({ id, amountPence })),
      leftPence,
    });
  });

  it("takes the lower number where two fell due together, and passes over what is paid", () => {
    const same = [
      debt("SG-2", "2026-11-01", 100),
      debt("SG-1", "2026-11-01", 100),
      debt("SG-0", "2026-10-01", 0),
    ];
    expect(allocateOldestFirst(50, same).parts).toEqual([{ id: "SG-1", amountPence: 50 }]);
  });

  it("loses no penny, overpays no debt and leaves no older debt open", () => {
    const arbitrary = fc.array(
      fc.record({
        id: fc.uuid(),
        number: fc.string({ maxLength: 4 }),
        dueOn: fc
          .date({ min: new Date("2025-01-01"), max: new Date("2026-12-31"), noInvalidDate: true })
          .map((d) => d.toISOString().slice(0, 10)),
        owedPence: fc.integer({ min: 0, max: 50_000 }),
      }),
      { maxLength: 15 },
    );
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 400_000 }), arbitrary, (amount, owed) => {
        const { parts, leftPence } = allocateOldestFirst(amount, owed);
        expect(sumPence(parts.map((p) => p.amountPence)) + leftPence).toBe(amount);
        const took = new Map(parts.map((p) => [p.id, p.amountPence]));
        const lastPaid =
          owed
            .filter((d) => took.has(d.id))
            .map((d) => d.dueOn)
            .sort()
            .at(-1) ?? "";
        for (const d of owed) {
          expect(took.get(d.id) ?? 0).toBeLessThanOrEqual(d.owedPence);
          if (d.dueOn < lastPaid) expect(took.get(d.id) ?? 0).toBe(d.owedPence);
        }
        if (leftPence > 0) expect(amount - leftPence).toBe(sumPence(owed.map((d) => d.owedPence)));
      }),
    );
  });
});
