import type { Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/plain-date";

export interface Debt {
  readonly id: string;
  readonly dueOn: PlainDateText;
  readonly number: string;
  readonly owedPence: Pence;
}

export interface AllocationPart {
  readonly id: string;
  readonly amountPence: Pence;
}

export interface Allocation {
  readonly parts: readonly AllocationPart[];
  /** What no debt could take: it stays with the payer as credit. */
  readonly leftPence: Pence;
}

/**
 * Pays the oldest due debt first, then the next. The parts and what is left always add up to the amount.
 * @throws RangeError where the amount is negative or not whole pence
 */
export function allocateOldestFirst(amountPence: Pence, debts: readonly Debt[]): Allocation {
  if (!Number.isSafeInteger(amountPence) || amountPence < 0)
    throw new RangeError("The amount must be whole pence, zero or more.");
  const inOrder = debts
    .filter((d) => d.owedPence > 0)
    .sort(
      (a, b) =>
        a.dueOn.localeCompare(b.dueOn) || a.number.localeCompare(b.number) || a.id.localeCompare(b.id),
    );
  const parts: AllocationPart[] = [];
  let left = amountPence;
  for (const debt of inOrder) {
    if (left === 0) break;
    const amount = Math.min(left, debt.owedPence);
    parts.push({ id: debt.id, amountPence: amount });
    left -= amount;
  }
  return { parts, leftPence: left };
}
