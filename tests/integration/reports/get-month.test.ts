import type { FigureKey, ListFigureRowsInput } from "@withy/contracts/reports";
import { newId } from "@withy/core/ids";
import { absences, invoices, payments, refunds, siteClosures } from "@withy/db/schema";
import { getMonth, listFigureRows } from "@withy/services/reports";
import { beforeAll, describe, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

// November 2026 has 21 weekdays. Each therapist offers 7 hours on each: 8 to 16 less lunch.
const day = 7 * 60;

let practice: TestPractice;

interface Bill {
  number: number;
  patientId: string;
  issuedOn: string;
  net: number;
  paid?: { at: string; pence: number; refunded?: { at: string; pence: number } };
  values?: Partial<typeof invoices.$inferInsert>;
}

async function bill({ number, patientId, issuedOn, net, paid, values }: Bill) {
  const { practiceId } = practice;
  const invoice = {
    practiceId,
    id: newId(),
    number,
    reference: `MP-${number}`,
    state: "issued" as const,
    patientId,
    siteId: practice.sites.saltgate.id,
    billTo: { name: "", addressLines: [], postcode: null, email: null },
    issuedOn,
    dueOn: issuedOn,
    issuedAt: new Date(`${issuedOn}T12:00:00Z`),
    netPence: net,
    vatPence: 0,
    totalPence: net,
    paidPence: (paid?.pence ?? 0) - (paid?.refunded?.pence ?? 0),
    vatRounding: "line-nearest",
    createdAt: practice.clock.now(),
    createdBy: practice.staff.accounts.id,
    updatedAt: practice.clock.now(),
    ...values,
  };
  await practice.db.insert(invoices).values(invoice);
  if (!paid) return;
  const payment = {
    practiceId,
    id: newId(),
    invoiceId: invoice.id,
    siteId: invoice.siteId,
    method: "cash" as const,
    amountPence: paid.pence,
    refundedPence: paid.refunded?.pence ?? 0,
    receivedAt: new Date(paid.at),
  };
  await practice.db.insert(payments).values(payment);
  if (paid.refunded)
    await practice.db.insert(refunds).values({
      practiceId,
      id: newId(),
      paymentId: payment.id,
      invoiceId: invoice.id,
      amountPence: paid.refunded.pence,
      reason: "Paid twice",
      method: "cash",
      isOwedAgain: true,
      state: "done",
      refundedAt: new Date(paid.refunded.at),
      refundedBy: practice.staff.accounts.id,
    });
}

beforeAll(async () => {
  practice = await buildPractice();
  const [old, fresh, other] = [
    await addPatient(practice),
    await addPatient(practice),
    await addPatient(practice),
  ];
  const ana = { therapistId: practice.staff.therapist.id };
  const tomasz = {
    therapistId: practice.staff.otherTherapist.id,
    siteId: practice.sites.tollhouse.id,
    roomId: practice.rooms.tollhouseRoom1.id,
  };
  const visit = (patientId: string, on: string, time: string, values: object, minutes = 30) =>
    addAppointment(practice, { patientId, day: on, time, minutes, values });
  await visit(old.id, "2026-10-20", "10:00", { ...ana, state: "fulfilled" });
  await visit(old.id, "2026-11-03", "10:00", { ...ana, state: "fulfilled" });
  await visit(fresh.id, "2026-11-03", "11:00", { ...ana, state: "fulfilled" }, 45);
  await visit(fresh.id, "2026-11-10", "10:00", { ...ana, state: "fulfilled" });
  await visit(old.id, "2026-11-10", "11:00", { ...ana, state: "noshow" });
  await visit(old.id, "2026-11-17", "10:00", { ...ana, state: "cancelled", isLateCancellation: true });
  await visit(other.id, "2026-11-17", "14:00", { ...tomasz, state: "confirmed" }, 60);
  // The last minutes of November and the first of December, on the practice's clock.
  await visit(other.id, "2026-11-30", "15:30", { ...tomasz, state: "booked" });
  await visit(other.id, "2026-12-01", "08:00", { ...tomasz, state: "booked" });
  // Ana is away for a day and a half, lunch included; Saltgate is shut for a day.
  await practice.db.insert(absences).values({
    practiceId: practice.practiceId,
    id: newId(),
    staffMemberId: practice.staff.therapist.id,
    kind: "leave",
    reason: "Leave",
    startsAt: new Date("2026-11-19T08:00:00Z"),
    endsAt: new Date("2026-11-20T12:00:00Z"),
    createdBy: practice.staff.owner.id,
  });
  await practice.db.insert(siteClosures).values({
    practiceId: practice.practiceId,
    siteId: practice.sites.saltgate.id,
    closedOn: "2026-11-27",
    reason: "Boiler",
  });
  const insurer = { payerId: practice.payers.insurer.id };
  await bill({
    number: 1,
    patientId: old.id,
    issuedOn: "2026-10-31",
    net: 5200,
    paid: { at: "2026-11-02T10:00:00Z", pence: 5200 },
  });
  await bill({ number: 2, patientId: old.id, issuedOn: "2026-11-01", net: 5200 });
  await bill({
    number: 3,
    patientId: fresh.id,
    issuedOn: "2026-11-30",
    net: 6800,
    paid: { at: "2026-11-30T23:59:00Z", pence: 6800, refunded: { at: "2026-11-30T23:59:30Z", pence: 1000 } },
  });
  await bill({ number: 4, patientId: fresh.id, issuedOn: "2026-11-12", net: 6100, values: insurer });
  await bill({
    number: 5,
    patientId: fresh.id,
    issuedOn: "2026-11-12",
    net: 9900,
    values: { state: "void" },
  });
  await bill({ number: 6, patientId: fresh.id, issuedOn: "2026-12-01", net: 9900 });
});

const owner = () => contextFor(practice, "owner");
const november = () => getMonth(owner(), { month: "2026-11" });

async function figure(key: FigureKey) {
  const found = (await november()).figures.find((f) => f.key === key);
  if (!found) throw new Error(`There is no figure ${key}.`);
  return found;
}

async function rows(input: Omit<ListFigureRowsInput, "month">) {
  return listFigureRows(owner(), { month: "2026-11", pageSize: 100, ...input });
}

describe("utilisation", () => {
  test("minutes on offer: patterns less breaks, leave and closed days", async () => {
    const { whole, therapists, bySite } = await november();
    const [ana, idris, tomasz] = [21 * day - day - 240 - day, 21 * day - day, 21 * day];
    expect(whole.onOfferMinutes).toBe(ana + idris + tomasz);
    const offered = new Map(therapists.map((row) => [row.name, row.onOfferMinutes]));
    expect(offered.get("Ana Ferreby")).toBe(ana);
    expect(offered.get("Idris Vane")).toBe(idris);
    expect(offered.get("Tomasz Hale")).toBe(tomasz);
    expect(bySite.map((row) => [row.name, row.onOfferMinutes])).toEqual([
      ["Saltgate", ana + idris],
      ["Tollhouse Lane", tomasz],
    ]);
  });

  test("booked without what was cancelled, delivered only what was attended", async () => {
    const { whole, therapists } = await november();
    expect(whole).toMatchObject({ bookedMinutes: 30 + 45 + 30 + 30 + 60 + 30, deliveredMinutes: 105 });
    expect(whole.booked).toBe(Math.round((225 / whole.onOfferMinutes) * 10_000));
    expect(therapists.find((row) => row.name === "Ana Ferreby")).toMatchObject({
      bookedMinutes: 135,
      deliveredMinutes: 105,
      siteNames: ["Saltgate"],
    });
  });

  test("one site alone", async () => {
    const view = await getMonth(owner(), { month: "2026-11", siteId: practice.sites.tollhouse.id });
    expect(view.whole).toMatchObject({ onOfferMinutes: 21 * day, bookedMinutes: 90, deliveredMinutes: 0 });
    expect(view.therapists.map((row) => row.name)).toEqual(["Tomasz Hale"]);
    expect(view.figures.find((f) => f.key === "billed")?.value).toBe(0);
  });

  test("percent booked by weekday and hour on the site's clock", async () => {
    const { heat } = await november();
    expect(heat.hours).toEqual([8, 9, 10, 11, 12, 13, 14, 15]);
    const tuesday = heat.rows.find((row) => row.weekday === 2);
    // Four Tuesdays, three therapists: 720 minutes on offer each hour.
    expect(tuesday?.percent).toEqual([0, 0, 8, 10, null, 0, 8, 0]);
  });
});

describe("people and money", () => {
  test("attendance, cancellations and new patients", async () => {
    expect(await figure("did-not-attend")).toMatchObject({ numerator: 1, denominator: 4, value: 2500 });
    expect(await figure("cancelled")).toMatchObject({ numerator: 1, denominator: 7, value: 1429 });
    expect(await figure("new-patients")).toMatchObject({ value: 1, before: 1 });
    const view = await november();
    expect(view.visitsPerNewPatient).toBe(300);
    expect(view.lateCancellations).toBe(1);
  });

  test("billed in the month without void ones, by who pays; collected less refunds, for any month's invoices", async () => {
    expect(await figure("billed")).toMatchObject({ value: 5200 + 6800 + 6100, numerator: 3, before: 5200 });
    expect(await figure("collected")).toMatchObject({ value: 5200 + 6800 - 1000 });
    const { income, debts } = await november();
    expect(income).toEqual([
      { kind: "patient", invoices: 2, netPence: 12_000, netPenceBefore: 5200 },
      { kind: "insurer", invoices: 1, netPence: 6100, netPenceBefore: 0 },
      { kind: "employer", invoices: 0, netPence: 0, netPenceBefore: 0 },
    ]);
    expect(debts?.totalPence).toBe(5200 + 1000 + 6100 + 9900);
  });

  test("a month without anything has no data, not zero percent", async () => {
    const empty = await buildPractice();
    const view = await getMonth(contextFor(empty, "owner"), { month: "2025-06" });
    expect(view.whole).toMatchObject({ onOfferMinutes: 0, booked: null, delivered: null });
    expect(view.figures.find((f) => f.key === "did-not-attend")?.value).toBeNull();
    expect(view.visitsPerNewPatient).toBeNull();
    expect(view.pencePerAttendedHour).toBeNull();
    expect(view.heat).toEqual({ hours: [], rows: [] });
  });
});

describe("every figure opens the rows it is made of", () => {
  test.each(["booked", "delivered"] as const)("%s minutes, and the minutes on offer", async (key) => {
    const { numerator, denominator } = await figure(key);
    const answer = await rows({ figure: key });
    expect(answer.sumMinutes).toBe(numerator);
    expect(answer.rows.reduce((n, row) => n + (row.minutes ?? 0), 0)).toBe(numerator);
    const offered = await rows({ figure: "on-offer" });
    expect(offered.sumMinutes).toBe(denominator);
  });

  test.each(["did-not-attend", "cancelled", "new-patients"] as const)(
    "%s and what it is out of",
    async (key) => {
      const { numerator, denominator, of } = await figure(key);
      expect(await rows({ figure: key })).toMatchObject({ total: numerator });
      if (of) expect(await rows({ figure: of })).toMatchObject({ total: denominator });
    },
  );

  test.each(["billed", "collected"] as const)("%s", async (key) => {
    const { value } = await figure(key);
    const answer = await rows({ figure: key });
    expect(answer.sumPence).toBe(value);
    expect(answer.rows.reduce((n, row) => n + (row.pence ?? 0), 0)).toBe(value);
    expect(answer.total).toBe(answer.rows.length);
  });

  test("one therapist's and one kind of payer's, page by page", async () => {
    const therapistId = practice.staff.therapist.id;
    expect(await rows({ figure: "booked", therapistId })).toMatchObject({ sumMinutes: 135, total: 4 });
    expect(await rows({ figure: "on-offer", therapistId })).toMatchObject({
      sumMinutes: 21 * day - 2 * day - 240,
    });
    expect(await rows({ figure: "billed", payerKind: "insurer" })).toMatchObject({
      sumPence: 6100,
      total: 1,
    });
    const second = await rows({ figure: "all-visits", page: 2, pageSize: 5 });
    expect(second).toMatchObject({ total: 7, page: 2 });
    expect(second.rows).toHaveLength(2);
  });
});

describe("who may ask", () => {
  test("owners and accounts, not therapists or the desk", async () => {
    await expect(getMonth(contextFor(practice, "accounts"), { month: "2026-11" })).resolves.toBeDefined();
    for (const person of ["therapist", "receptionist"] as const) {
      const ctx = contextFor(practice, person);
      await expect(getMonth(ctx, { month: "2026-11" })).rejects.toMatchObject({ code: "forbidden" });
      await expect(listFigureRows(ctx, { month: "2026-11", figure: "billed" })).rejects.toMatchObject({
        code: "forbidden",
      });
    }
  });

  test("an owner of one site reads that site; another's, and another practice's, are not found", async () => {
    const atTollhouse = contextFor(practice, "owner", {
      roles: [{ role: "owner", siteId: practice.sites.tollhouse.id }],
    });
    const view = await getMonth(atTollhouse, { month: "2026-11" });
    expect(view.sites.map((site) => site.name)).toEqual(["Tollhouse Lane"]);
    expect(view.figures.find((f) => f.key === "billed")?.value).toBe(0);
    const other = await buildPractice();
    for (const siteId of [practice.sites.saltgate.id, other.sites.saltgate.id, newId()])
      await expect(getMonth(atTollhouse, { month: "2026-11", siteId })).rejects.toMatchObject({
        code: "not-found",
      });
  });

  test("a month must be one", async () => {
    await expect(getMonth(owner(), { month: "2026-13" })).rejects.toMatchObject({ code: "invalid" });
  });
});
