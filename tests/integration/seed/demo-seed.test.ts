import { sessionTime } from "@withy/clinical/programmes/compute-time";
import {
  appointments,
  diaryClaims,
  invoices,
  notes,
  offerRounds,
  payments,
  practices,
  staffAccounts,
  waitingEntries,
  waitingOffers,
} from "@withy/db/schema";
import { isSeeded, seedDemo } from "@withy/db/seed";
import { holdingStates } from "@withy/diary/appointment-states";
import { matchesPassword } from "@withy/services/practices";
import { eq, inArray, sql } from "drizzle-orm";
import { beforeAll, expect, test } from "vitest";
import { demoPassword } from "../../../scripts/settings.mjs";
import { asDatabaseOwner, testConnection } from "../../support/connection";

const now = new Date("2026-12-01T10:42:00Z");
const { db } = testConnection();
let ids: string[];

beforeAll(async () => {
  await asDatabaseOwner(async (connection) => {
    await seedDemo(connection, now);
    expect(await isSeeded(connection)).toBe(true);
  });
  const rows = await db
    .select()
    .from(practices)
    .where(inArray(practices.name, ["Marram Physiotherapy", "Cairn & Firth Clinics"]));
  const accounts = await db
    .select()
    .from(staffAccounts)
    .where(inArray(staffAccounts.email, ["owner@marram.example", "owner@cairnfirth.example"]));
  ids = rows.map((row) => row.id).filter((id) => accounts.some((account) => account.practiceId === id));
});

test("the five sign-ins open with the one password", async () => {
  const emails = [
    "owner@marram.example",
    "therapist@marram.example",
    "reception@marram.example",
    "accounts@marram.example",
    "owner@cairnfirth.example",
  ];
  const accounts = await db.select().from(staffAccounts).where(inArray(staffAccounts.email, emails));
  expect(accounts.map((account) => account.email).sort()).toEqual([...emails].sort());
  for (const account of accounts)
    expect(await matchesPassword(account.passwordHash, demoPassword)).toBe(true);
});

test("every visit that holds time and lies within sixty days claims it, once for the therapist and once for the room", async () => {
  const since = sql`${appointments.startsAt} > ${new Date(now.getTime() - 60 * 86_400_000)}`;
  const [implied] = await db
    .select({
      slots: sql<string>`sum(2 * (timestampdiff(minute, ${appointments.startsAt}, ${appointments.endsAt}) + ${appointments.cleanDownMinutes}) / 5)`,
    })
    .from(appointments)
    .where(
      sql`${inArray(appointments.practiceId, ids)} and ${since} and ${inArray(appointments.state, [...holdingStates])}`,
    );
  const [claimed] = await db
    .select({ slots: sql<number>`count(*)` })
    .from(diaryClaims)
    .where(inArray(diaryClaims.practiceId, ids));
  expect(Number(claimed?.slots)).toBe(Number(implied?.slots));
  expect(Number(claimed?.slots)).toBeGreaterThan(50_000);
});

test("the diary has every state, past and to come", async () => {
  const rows = await db
    .select({ state: appointments.state, count: sql<number>`count(*)` })
    .from(appointments)
    .where(inArray(appointments.practiceId, ids))
    .groupBy(appointments.state);
  expect(rows.map((row) => row.state).sort()).toEqual([
    "arrived",
    "booked",
    "cancelled",
    "confirmed",
    "fulfilled",
    "in-session",
    "noshow",
  ]);
});

test("invoice numbers run without a gap and money adds up", async () => {
  for (const practiceId of ids) {
    const rows = await db.select().from(invoices).where(eq(invoices.practiceId, practiceId));
    const numbers = rows.flatMap((row) => row.number ?? []).sort((a, b) => a - b);
    expect(numbers).toEqual(numbers.map((_, i) => i + 1));
    const paid = await db.select().from(payments).where(eq(payments.practiceId, practiceId));
    const received = paid.reduce((sum, row) => sum + row.amountPence - row.refundedPence, 0);
    expect(rows.reduce((sum, row) => sum + row.paidPence, 0)).toBe(received);
  }
});

test("notes are signed, but for a few of the last day", async () => {
  const rows = await db
    .select({ state: notes.state, visitAt: notes.visitAt })
    .from(notes)
    .where(inArray(notes.practiceId, ids));
  const drafts = rows.filter((row) => row.state === "draft");
  expect(drafts.length).toBeGreaterThan(0);
  expect(Math.min(...drafts.map((row) => row.visitAt.getTime()))).toBeGreaterThan(
    now.getTime() - 48 * 3_600_000,
  );
});

test("the harbour programme has ten items and takes twenty minutes", async () => {
  const [rows] =
    await db.execute(sql`select v.content from programmes p join programme_versions v on v.practice_id = p.practice_id and v.programme_id = p.id
    where p.title = 'Harbour programme' and ${inArray(sql`p.practice_id`, ids)}`);
  const [row] = rows as unknown as { content: Parameters<typeof sessionTime>[0] }[];
  if (!row) throw new Error("The programme is missing.");
  expect(row.content.items).toHaveLength(10);
  expect(sessionTime(row.content).elapsedSeconds).toBe(20 * 60);
});

test("a dozen people wait with wishes, and one time that nobody has taken is on offer to some of them", async () => {
  const entries = await db.select().from(waitingEntries).where(inArray(waitingEntries.practiceId, ids));
  expect(entries.filter((entry) => Object.keys(entry.wishes).length > 0).length).toBeGreaterThan(6);
  expect(new Set(entries.map((entry) => entry.urgency)).size).toBe(3);
  const rounds = await db.select().from(offerRounds).where(inArray(offerRounds.practiceId, ids));
  const open = rounds.filter((round) => round.state === "open" && round.expiresAt > now);
  expect(open.length).toBeGreaterThan(0);
  for (const round of open) {
    const taken = await db
      .select()
      .from(diaryClaims)
      .where(
        sql`${diaryClaims.resourceId} = ${round.therapistId} and ${diaryClaims.slotAt} = ${round.startsAt}`,
      );
    expect(taken).toEqual([]);
    const offers = await db.select().from(waitingOffers).where(eq(waitingOffers.roundId, round.id));
    expect(offers.some((offer) => offer.state === "open")).toBe(true);
  }
});
