import { choosePrice, type Price } from "@withy/billing/prices";
import { addDays } from "@withy/core/zoned-time";
import { patientPayers } from "../schema";
import type { House, PatientRow, Stage } from "./stage";
import type { Course, Visit } from "./visit";

export interface InvoiceLinePlan {
  readonly visit: Visit | null;
  readonly productId: string | null;
  readonly description: string;
  readonly unitPence: number;
  readonly vatTreatment: "exempt" | "standard";
}

/** One invoice of the story, before it is added up. */
export interface InvoicePlan {
  readonly patient: PatientRow;
  readonly payerId: string | null;
  readonly siteId: string;
  readonly lines: InvoiceLinePlan[];
  /** Null: still a draft. */
  readonly issuedOn: string | null;
  readonly paymentDays: number;
}

/** People pay at each visit; payers get one invoice for each patient and month. The last days are not invoiced yet. */
export function planInvoices(stage: Stage, house: House, courses: readonly Course[]): InvoicePlan[] {
  const payerOf = new Map(
    stage.rows
      .of(patientPayers)
      .filter((row) => row.practiceId === house.practiceId)
      .map((row) => [row.patientId, row.payerId]),
  );
  const priceList: Price[] = house.prices.map((row) => ({
    ...row,
    itemId: row.serviceId ?? row.productId ?? "",
    siteId: row.siteId ?? null,
    payerId: row.payerId ?? null,
    validUntil: row.validUntil ?? null,
  }));
  const plans: InvoicePlan[] = [];
  const monthly = new Map<string, InvoicePlan>();
  for (const visit of courses
    .flatMap((course) => course.visits)
    .sort((a, b) => a.startsAt.getTime() - b.startsAt.getTime())) {
    if (visit.state !== "fulfilled") continue;
    const payerId = payerOf.get(visit.course.patient.id) ?? null;
    const price = choosePrice(priceList, {
      itemId: visit.service.id,
      siteId: visit.site.id,
      payerId,
      on: visit.day,
    });
    if (!price) continue;
    const line = visitLine(visit, price.amountPence);
    if (payerId === null) planOwn(stage, house, visit, line, plans);
    else planForPayer(stage, visit, payerId, line, plans, monthly);
  }
  return plans;
}

const visitLine = (visit: Visit, unitPence: number): InvoiceLinePlan => ({
  visit,
  productId: null,
  description: `${visit.service.name}, ${visit.service.durationMinutes} minutes`,
  unitPence,
  vatTreatment: "exempt",
});

function planOwn(
  { random, today }: Stage,
  house: House,
  visit: Visit,
  line: InvoiceLinePlan,
  plans: InvoicePlan[],
): void {
  const isToday = visit.day === today;
  if (isToday && random.chance(0.6)) return;
  const lines = [line];
  if (random.chance(0.06)) {
    const at = random.int(0, house.products.length - 1);
    const [product, plan] = [house.products[at], house.plan.products[at]];
    if (product && plan)
      lines.push({
        visit: null,
        productId: product.id,
        description: product.name,
        unitPence: plan.pence,
        vatTreatment: "standard",
      });
  }
  const isDraft = isToday && random.chance(0.4);
  plans.push({
    patient: visit.course.patient,
    payerId: null,
    siteId: visit.site.id,
    lines,
    issuedOn: isDraft ? null : visit.day,
    paymentDays: 14,
  });
}

function planForPayer(
  { today }: Stage,
  visit: Visit,
  payerId: string,
  line: InvoiceLinePlan,
  plans: InvoicePlan[],
  monthly: Map<string, InvoicePlan>,
): void {
  const month = visit.day.slice(0, 7);
  // This month's visits wait for its end.
  if (month === today.slice(0, 7) || addDays(`${month}-28`, 6) > today) return;
  const key = `${month} ${visit.course.patient.id} ${payerId} ${visit.site.id}`;
  const open = monthly.get(key);
  if (open) {
    open.lines.push(line);
    return;
  }
  const issuedOn = addDays(`${month}-28`, 5);
  const plan = {
    patient: visit.course.patient,
    payerId,
    siteId: visit.site.id,
    lines: [line],
    issuedOn,
    paymentDays: 30,
  };
  monthly.set(key, plan);
  plans.push(plan);
}
