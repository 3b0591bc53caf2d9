import type { TimelineEntry } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { invoices, letters, measureRecords, notes, outboxMessages, payments } from "@withy/db/schema";
import { getTimeline } from "@withy/services/patients";
import { beforeAll, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";

let practice: TestPractice;
let patientId: string;

const at = (text: string) => new Date(text);
const stamp = () => ({ practiceId: practice.practiceId, id: newId() });

beforeAll(async () => {
  practice = await buildPractice();
  const patient = await addPatient(practice);
  patientId = patient.id;
  const episode = await addEpisode(practice, patientId);
  const day = { patientId, time: "10:15" };
  await addAppointment(practice, { ...day, day: "2026-11-10", values: { state: "fulfilled" } });
  await addAppointment(practice, { ...day, day: "2026-11-17", values: { state: "fulfilled" } });
  await addAppointment(practice, { ...day, day: "2026-12-08" });
  await addAppointment(practice, {
    ...day,
    day: "2026-11-24",
    values: { siteId: practice.sites.tollhouse.id, roomId: practice.rooms.tollhouseRoom1.id },
  });
  const written = { createdAt: at("2026-11-10T11:00:00Z"), updatedAt: at("2026-11-10T11:00:00Z") };
  await practice.db.insert(notes).values({
    ...stamp(),
    ...written,
    episodeId: episode.id,
    patientId,
    authorId: practice.staff.therapist.id,
    kind: "initial",
    state: "signed",
    body: {} as never,
    visitAt: at("2026-11-10T10:15:00Z"),
    signedAt: at("2026-11-10T11:02:00Z"),
    signedBy: practice.staff.therapist.id,
    signedName: "Ana Ferreby",
    bodyHash: "0".repeat(64),
  });
  await practice.db.insert(measureRecords).values({
    ...stamp(),
    episodeId: episode.id,
    patientId,
    measureKey: "pain-rating",
    ruleVersion: "2026-12",
    answers: { items: [5] },
    scores: { pain: 5 },
    takenOn: "2026-11-10",
    enteredBy: practice.staff.therapist.id,
    enteredAt: at("2026-11-10T10:40:00Z"),
  });
  await practice.db.insert(letters).values({
    ...stamp(),
    ...written,
    episodeId: episode.id,
    patientId,
    authorId: practice.staff.therapist.id,
    kind: "discharge",
    reference: "L-1",
    recipient: { kind: "gp", name: "Dr Ruth Ellery", addressLines: [], email: null },
    sections: [],
    datedOn: "2026-11-18",
    createdAt: at("2026-11-18T09:00:00Z"),
  });
  const invoice = {
    ...stamp(),
    number: 1,
    reference: "MP-00001",
    state: "paid" as const,
    patientId,
    siteId: practice.sites.saltgate.id,
    billTo: { name: "", addressLines: [], postcode: null, email: null },
    issuedOn: "2026-11-10",
    issuedAt: at("2026-11-10T12:00:00Z"),
    netPence: 6200,
    totalPence: 6200,
    paidPence: 6200,
    vatRounding: "line-nearest",
    createdBy: practice.staff.accounts.id,
    ...written,
  };
  await practice.db.insert(invoices).values(invoice);
  await practice.db.insert(payments).values({
    ...stamp(),
    invoiceId: invoice.id,
    siteId: invoice.siteId,
    method: "terminal",
    amountPence: 6200,
    receivedAt: at("2026-11-12T16:00:00Z"),
  });
  await practice.db.insert(outboxMessages).values({
    ...stamp(),
    channel: "email",
    template: "booking-confirmed",
    toAddress: "someone@post.example",
    payload: {},
    aboutKind: "appointment",
    aboutId: newId(),
    patientId,
    dedupeKey: newId(),
    dueAt: at("2026-11-09T09:00:00Z"),
    createdAt: at("2026-11-09T09:00:00Z"),
  });
});

async function kindsFor(person: TestPerson): Promise<string[]> {
  const { entries } = await getTimeline(contextFor(practice, person), { patientId });
  expect(entries.map((e) => e.at)).toEqual(
    entries
      .map((e) => e.at)
      .toSorted()
      .reverse(),
  );
  return entries.map((e) => e.kind);
}

test("each role sees its own sources, newest first", async () => {
  expect(await kindsFor("therapist")).toEqual([
    ...["visit", "visit", "letter", "visit"],
    ...["note", "measure", "visit"],
  ]);
  expect(await kindsFor("receptionist")).toEqual([
    ...["visit", "visit", "payment", "invoice"],
    ...["note", "visit", "message"],
  ]);
  expect(await kindsFor("accounts")).toEqual(["payment", "invoice"]);
  expect(await kindsFor("tollhouseReceptionist")).toEqual(["visit", "message"]);
});

test("a signed note has its problem only for whoever may read it", async () => {
  const problemFor = async (person: TestPerson) => {
    const { entries } = await getTimeline(contextFor(practice, person), { patientId, kind: "notes" });
    return entries.map((e) => (e.kind === "note" ? e.problem : "not a note"));
  };
  expect(await problemFor("therapist")).toEqual(["Hip osteoarthritis"]);
  expect(await problemFor("receptionist")).toEqual([null]);
});

test("one kind at a time", async () => {
  const ctx = contextFor(practice, "owningTherapist");
  const money = await getTimeline(ctx, { patientId, kind: "money" });
  expect(money.entries.map((e) => e.kind)).toEqual(["payment", "invoice"]);
  const measures = await getTimeline(ctx, { patientId, kind: "measures" });
  expect(measures.entries).toMatchObject([
    { measureKey: "pain-rating", result: "5 points", day: "2026-11-10", time: "10:40" },
  ]);
});

test.each([1, 2, 3, 7])("pages of %i meet without a gap and without a repeat", async (size) => {
  const ctx = contextFor(practice, "owningTherapist");
  const whole = await getTimeline(ctx, { patientId, size: 100 });
  expect(whole.next).toBeNull();
  const seen: TimelineEntry[] = [];
  let before: string | undefined;
  do {
    const page = await getTimeline(ctx, { patientId, size, before });
    seen.push(...page.entries);
    before = page.next ?? undefined;
  } while (before !== undefined);
  expect(seen).toEqual(whole.entries);
});

test("another practice's patient and a guessed id are not found", async () => {
  const ctx = contextFor(await buildPractice(), "owningTherapist");
  await expect(getTimeline(ctx, { patientId })).rejects.toMatchObject({ code: "not-found" });
  await expect(getTimeline(ctx, { patientId: newId() })).rejects.toMatchObject({ code: "not-found" });
});
