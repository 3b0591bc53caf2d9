import type { AgeBucket } from "@withy/billing/ageing";
import { readInvoiceNumber } from "@withy/billing/invoice-number";
import type { InvoiceKind } from "@withy/contracts/billing";
import { type RoleHolding, sitesWith } from "@withy/core/access/can";
import { foldName } from "@withy/core/names";
import { addDays, type PlainDateText } from "@withy/core/zoned-time";
import { type InvoiceStateCode, invoices, patients } from "@withy/db/schema";
import { and, eq, gte, inArray, isNull, like, lt, lte, ne, or, type SQL, sql } from "drizzle-orm";

export interface InvoiceFilter {
  readonly kind: InvoiceKind;
  readonly age?: AgeBucket | undefined;
  readonly payer?: string | undefined;
  readonly siteId?: string | undefined;
  readonly patientId?: string | undefined;
  readonly find?: string | undefined;
}

/** What is owed on a row; nothing where the invoice is not one that can be owed on. */
export const owedColumn =
  sql<number>`case when ${invoices.state} in ('issued', 'part-paid') then ${invoices.totalPence} - ${invoices.creditedPence} - ${invoices.paidPence} else 0 end`.mapWith(
    Number,
  );

const kinds: Record<Exclude<InvoiceKind, "all">, readonly InvoiceStateCode[]> = {
  owed: ["issued", "part-paid"],
  overdue: ["issued", "part-paid"],
  paid: ["paid"],
  refunded: ["refunded"],
  void: ["void"],
};

/** The due dates of a bucket: see `bucketOf`, which puts the same days into it one by one. */
function ofAge(age: AgeBucket, today: PlainDateText): SQL | undefined {
  const due = invoices.dueOn;
  const daysAgo = (days: number): PlainDateText => addDays(today, -days);
  switch (age) {
    case "not-due":
      return sql`${due} > ${today}`;
    case "0-30":
      return and(lte(due, today), gte(due, daysAgo(30)));
    case "31-60":
      return and(lt(due, daysAgo(30)), gte(due, daysAgo(60)));
    case "61-90":
      return and(lt(due, daysAgo(60)), gte(due, daysAgo(90)));
    case "over-90":
      return lt(due, daysAgo(90));
  }
}

const likeStart = (text: string): string => `${text.replace(/[\\%_]/g, "\\$&")}%`;

function found(text: string | undefined): SQL | undefined {
  if (text === undefined || text === "") return undefined;
  const number = readInvoiceNumber(text);
  const name = foldName(text);
  return or(
    number ? eq(invoices.number, number.counter) : undefined,
    like(invoices.reference, likeStart(text.toUpperCase())),
    name === "" ? undefined : like(patients.nameLastFirst, likeStart(name)),
    name === "" ? undefined : like(patients.nameFirstLast, likeStart(name)),
  );
}

/** The where-clause of a filter, inside the practice and the sites that the person may read. */
export function whereInvoices(
  practiceId: string,
  roles: readonly RoleHolding[],
  filter: InvoiceFilter,
  today: PlainDateText,
): SQL | undefined {
  const reach = sitesWith(roles, "billing.read");
  return and(
    eq(invoices.practiceId, practiceId),
    reach === "all" ? undefined : inArray(invoices.siteId, reach.length === 0 ? [""] : reach),
    filter.kind === "all" ? ne(invoices.state, "draft") : inArray(invoices.state, [...kinds[filter.kind]]),
    filter.kind === "overdue" ? lt(invoices.dueOn, today) : undefined,
    filter.age === undefined ? undefined : ofAge(filter.age, today),
    filter.payer === undefined
      ? undefined
      : filter.payer === "patients"
        ? isNull(invoices.payerId)
        : eq(invoices.payerId, filter.payer),
    filter.siteId === undefined ? undefined : eq(invoices.siteId, filter.siteId),
    filter.patientId === undefined ? undefined : eq(invoices.patientId, filter.patientId),
    found(filter.find),
  );
}
