import { fixedClock } from "@withy/core/clock";
import { newId } from "@withy/core/ids";
import { practices } from "@withy/db/schema";
import { testConnection } from "./connection";
import type { PracticeBase } from "./practice-base";
import { addPriceList } from "./practice-prices";
import { addSites } from "./practice-sites";
import { addStaff } from "./practice-staff";

/** Tuesday 1 December 2026, nine in the morning in Easterhaven. */
export const testNow = "2026-12-01T09:00:00Z";

let made = 0;

/**
 * A practice of its own for one suite: two sites, three therapists, a desk at each site, services, prices, one
 * insurer and one surgery, and a clock that stands at `testNow` until it is moved. Nothing is booked yet.
 */
export async function buildPractice(options: { name?: string; isVatRegistered?: boolean } = {}) {
  const { db } = testConnection();
  const clock = fixedClock(testNow);
  const practiceId = newId();
  made += 1;
  await db.insert(practices).values({
    id: practiceId,
    name: options.name ?? "Marram Physiotherapy",
    legalName: "Marram Physiotherapy Ltd",
    addressLines: ["2 Saltgate", "Easterhaven"],
    postcode: "ZZ1 2AB",
    phone: "+441632960100",
    email: `office${made}@marram.example`,
    vatNumber: options.isVatRegistered === false ? null : "GB 999 0012 34",
    invoicePrefix: "MP",
    createdAt: clock.now(),
  });
  const base: PracticeBase = { practiceId, db, clock, zone: "Europe/London" };
  const sites = await addSites(base);
  const staff = await addStaff(base, sites);
  const trade = await addPriceList(base, sites, staff);
  return { ...base, ...sites, ...staff, ...trade };
}

export type TestPractice = Awaited<ReturnType<typeof buildPractice>>;
