import type { FigureKey } from "@withy/contracts/reports";
import { newId } from "@withy/core/ids";
import { getMonth, listFigureRows } from "@withy/services/reports";
import { beforeAll, describe, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { buildNovember, fullDay } from "./build-november";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildNovember();
});

const owner = () => contextFor(practice, "owner");
const november = () => getMonth(owner(), { month: "2026-11" });

async function figure(key: FigureKey) {
  const found = (await november()).figures.find((f) => f.key === key);
  if (!found) throw new Error(`There is no figure ${key}.`);
  return found;
}

describe("utilisation", () => {
  test("minutes on offer: patterns less breaks, leave and closed days", async () => {
    const { whole, therapists, bySite } = await november();
    const [ana, idris, tomasz] = [
      21 * fullDay - fullDay - 240 - fullDay,
      21 * fullDay - fullDay,
      21 * fullDay,
    ];
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
    expect(view.whole).toMatchObject({
      onOfferMinutes: 21 * fullDay,
      bookedMinutes: 90,
      deliveredMinutes: 0,
    });
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
