import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { afterRefund, areSumsSound, type InvoiceSums, owedPence } from "./invoice-balance";
import {
  canMoveInvoice,
  type InvoiceState,
  invoiceMoves,
  invoiceStates,
  stateOfSums,
} from "./invoice-states";

type Step =
  | { readonly kind: "pay"; readonly part: number }
  | { readonly kind: "give-back"; readonly part: number; readonly isOwedAgain: boolean };

function walk(sums: InvoiceSums, step: Step): InvoiceSums {
  const most = step.kind === "pay" ? owedPence(sums) : sums.paidPence;
  const amount = Math.ceil((most * step.part) / 4);
  if (amount === 0) return sums;
  if (step.kind === "pay") return { ...sums, paidPence: sums.paidPence + amount };
  return afterRefund(sums, amount, step.isOwedAgain);
}

const part = fc.integer({ min: 1, max: 4 });
const steps = fc.array(
  fc.oneof(
    fc.record({ kind: fc.constant("pay" as const), part }),
    fc.record({ kind: fc.constant("give-back" as const), part, isOwedAgain: fc.boolean() }),
  ),
  { maxLength: 12 },
);

const unpaid = (totalPence: number): InvoiceSums => ({
  totalPence,
  paidPence: 0,
  creditedPence: 0,
  pendingPence: 0,
});

describe("invoice states", () => {
  it.each<[Partial<InvoiceSums>, InvoiceState]>([
    [{}, "issued"],
    [{ paidPence: 1 }, "part-paid"],
    [{ paidPence: 19800 }, "paid"],
    [{ creditedPence: 19800 }, "refunded"],
    [{ paidPence: 14800, creditedPence: 5000 }, "paid"],
    [{ paidPence: 14800 }, "part-paid"],
    [{ creditedPence: 5000 }, "issued"],
    [{ pendingPence: 19800 }, "issued"],
    [{ totalPence: 0 }, "paid"],
  ])("%o is %s", (sums, state) => {
    expect(stateOfSums({ ...unpaid(19800), ...sums })).toBe(state);
  });

  it("moves only as the table allows, however money comes and goes", () => {
    const seen = new Set<string>();
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1000 }), steps, (total, walked) => {
        let sums = unpaid(total);
        let state = stateOfSums(sums);
        for (const step of walked) {
          sums = walk(sums, step);
          expect(areSumsSound(sums)).toBe(true);
          const next = stateOfSums(sums);
          if (next !== state) expect(canMoveInvoice(state, next), `${state} to ${next}`).toBe(true);
          if (next !== state) seen.add(`${state} to ${next}`);
          state = next;
        }
      }),
      { numRuns: 2000 },
    );
    const byMoney = invoiceStates.filter((s) => s !== "draft" && s !== "void");
    const promised = byMoney.flatMap((from) =>
      invoiceMoves[from].filter((to) => to !== "void").map((to) => `${from} to ${to}`),
    );
    expect([...seen].sort()).toEqual(promised.sort());
  });

  it("lets nothing follow void or refunded", () => {
    expect(invoiceMoves.void).toEqual([]);
    expect(invoiceMoves.refunded).toEqual([]);
  });

  it("calls unsound whatever is more than asked for", () => {
    expect(areSumsSound({ ...unpaid(100), paidPence: 101 })).toBe(false);
    expect(areSumsSound({ ...unpaid(100), paidPence: -1 })).toBe(false);
    expect(areSumsSound({ ...unpaid(100), paidPence: 60, creditedPence: 41 })).toBe(false);
    expect(areSumsSound({ ...unpaid(100), paidPence: 60, pendingPence: 41 })).toBe(false);
    expect(areSumsSound({ ...unpaid(100), paidPence: 60, pendingPence: 40 })).toBe(true);
  });
});
