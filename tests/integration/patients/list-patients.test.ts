import { newId } from "@withy/core/ids";
import { invoices } from "@withy/db/schema";
import { listPatients } from "@withy/services/patients";
import { beforeAll, describe, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";

let practice: TestPractice;
let other: TestPractice;
let lukaszewska: { id: string };
let tamworth: { id: string };
let ann: { id: string };
let mcCreadie: { id: string };

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
  lukaszewska = await addPatient(practice, {
    givenName: "Zofia",
    familyName: "Łukaszewska-Brâncuși",
    bornOn: "1988-02-29",
    phone: "+447700900412",
  });
  tamworth = await addPatient(practice, {
    givenName: "Eleri Wyn",
    familyName: "Tamworth",
    bornOn: "1963-06-22",
    phone: "+447700900731",
    nhsNumber: "9993142786",
  });
  ann = await addPatient(practice, { givenName: "Annest", familyName: "Tamblyn", bornOn: "1963-06-22" });
  mcCreadie = await addPatient(practice, { givenName: "Tam", familyName: "McCreadie", phone: null });
  await addPatient(other, { givenName: "Eleri", familyName: "Tamworth", bornOn: "1963-06-22" });
  const now = practice.clock.now();
  await practice.db.insert(invoices).values({
    practiceId: practice.practiceId,
    id: newId(),
    number: 4187,
    reference: "MP-04187",
    state: "issued",
    patientId: tamworth.id,
    siteId: practice.sites.tollhouse.id,
    billTo: { name: "Eleri Tamworth", addressLines: [], postcode: null, email: null },
    issuedOn: "2026-11-30",
    dueOn: "2026-12-14",
    vatRounding: "line-nearest",
    createdAt: now,
    createdBy: practice.staff.accounts.id,
    updatedAt: now,
  });
});

async function idsFor(search: string, person: TestPerson = "owner"): Promise<string[]> {
  const page = await listPatients(contextFor(practice, person), { search });
  expect(page.total).toBe(page.rows.length);
  return page.rows.map((row) => row.id);
}

describe("one box finds a person", () => {
  test.each([
    ["family name, accents and case forgiven", "LUKASZEWSKA"],
    ["the second part of a double name after the first", "łukaszewska brancusi"],
    ["given name first", "zofia luka"],
    ["any phone format", "07700 900 412"],
    ["the last digits of the phone", "900412"],
    ["abroad's way of writing the phone", "+44 7700 900412"],
    ["date of birth in words", "29 feb 1988"],
    ["date of birth in figures", "29/2/88"],
    ["eight digits", "29021988"],
  ])("by %s", async (_, search) => {
    expect(await idsFor(search)).toEqual([lukaszewska.id]);
  });

  test("by the beginnings of two names in either order, a middle name in between", async () => {
    expect(await idsFor("tamw el")).toEqual([tamworth.id]);
    expect(await idsFor("el tamw")).toEqual([tamworth.id]);
  });

  test("by name and date of birth together", async () => {
    expect(await idsFor("tamworth 22/6/1963")).toEqual([tamworth.id]);
    expect(await idsFor("22 June 1963")).toEqual([ann.id, tamworth.id]);
  });

  test("by NHS number, with and without spaces", async () => {
    expect(await idsFor("999 314 2786")).toEqual([tamworth.id]);
    expect(await idsFor("9993142786")).toEqual([tamworth.id]);
  });

  test("family names come before given names, each person once", async () => {
    expect(await idsFor("tam")).toEqual([ann.id, tamworth.id, mcCreadie.id]);
  });

  test("what means nothing finds nobody", async () => {
    expect(await idsFor("qqq")).toEqual([]);
    expect(await idsFor("%")).toEqual([]);
    expect(await idsFor("12")).toEqual([]);
  });
});

test("an invoice number opens its patient only for whoever reads that site's invoices", async () => {
  expect(await idsFor("MP-04187", "accounts")).toEqual([tamworth.id]);
  expect(await idsFor("mp 4187", "tollhouseReceptionist")).toEqual([tamworth.id]);
  expect(await idsFor("4187", "accounts")).toEqual([tamworth.id]);
  expect(await idsFor("MP-04187", "receptionist")).toEqual([]);
  expect(await idsFor("MP-04187", "therapist")).toEqual([]);
});

test("pages hold the whole list in name order, each person once", async () => {
  const crowd = await buildPractice();
  for (let i = 0; i < 7; i += 1) await addPatient(crowd, { givenName: "Jory", familyName: `Pask ${i}` });
  await addPatient(crowd, { givenName: "Paskal", familyName: "Aune" });
  const ctx = contextFor(crowd, "receptionist");
  const seen: string[] = [];
  for (const page of [1, 2, 3]) {
    const found = await listPatients(ctx, { search: "pask", page, pageSize: 3, withTotal: true });
    expect(found.total).toBe(8);
    seen.push(...found.rows.map((row) => row.name));
  }
  expect(seen).toEqual([...Array.from({ length: 7 }, (_, i) => `Jory Pask ${i}`), "Paskal Aune"]);
  const all = await listPatients(ctx, { search: "", pageSize: 100 });
  expect(all.rows[0]?.name).toBe("Paskal Aune");
  expect(all.total).toBe(8);
});

test("a field that finds as one types gets the best few, and hears that there are more", async () => {
  const few = await listPatients(contextFor(practice, "receptionist"), { search: "tam", pageSize: 2 });
  expect(few).toMatchObject({ total: 2, isCutShort: true });
  expect(few.rows.map((row) => row.id)).toEqual([ann.id, tamworth.id]);
});
