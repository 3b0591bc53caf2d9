import type { RegisterPatientInput } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { patientPayers, patients } from "@withy/db/schema";
import { listPatients, registerPatient } from "@withy/services/patients";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, test } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
let other: TestPractice;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
});

let made = 0;

/** Answers of a form that can be saved, each time for someone else. */
function answers(values: Partial<RegisterPatientInput> = {}): RegisterPatientInput {
  made += 1;
  return {
    givenName: "Perran",
    familyName: `Quillfeather ${String.fromCharCode(65 + made).repeat(6)}`,
    bornOn: `19${40 + made}-03-27`,
    phone: `01632 9605${String(made).padStart(2, "0")}`,
    email: `perran${made}@post.example`,
    ...values,
  };
}

const desk = () => contextFor(practice, "receptionist");

async function rowOf(id: string) {
  const [row] = await practice.db
    .select()
    .from(patients)
    .where(and(eq(patients.practiceId, practice.practiceId), eq(patients.id, id)));
  return row;
}

describe("a patient is registered", () => {
  test("with everything read as it was meant, the payer, and an audit row", async () => {
    const saved = await registerPatient(
      desk(),
      answers({
        givenName: "  Saoirse ",
        familyName: "Ó Dálaigh",
        preferredName: "Sersha",
        phone: "(01632) 960-199",
        email: " Saoirse@Post.Example ",
        addressLines: ["9 Kelp Street", "", "Easterhaven"],
        postcode: "zz46rn",
        nhsNumber: "999 314 2786",
        gpPracticeId: practice.gpPractices.surgery.id,
        payer: {
          payerId: practice.payers.insurer.id,
          policyNumber: "KW-1",
          sessionsAuthorised: 6,
          excessPence: 5000,
        },
      }),
    );
    expect(saved).toMatchObject({ name: "Saoirse Ó Dálaigh", phone: "01632 960199", postcode: "ZZ4 6RN" });
    expect(await rowOf(saved.id)).toMatchObject({
      email: "saoirse@post.example",
      phone: "+441632960199",
      addressLines: ["9 Kelp Street", "Easterhaven"],
      nhsNumber: "9993142786",
      homeSiteId: practice.sites.saltgate.id,
      nameLastFirst: "o dalaigh saoirse sersha",
      phoneReversed: "991069236144",
      version: 1,
    });
    const [payer] = await practice.db
      .select()
      .from(patientPayers)
      .where(eq(patientPayers.patientId, saved.id));
    expect(payer).toMatchObject({
      policyNumber: "KW-1",
      sessionsAuthorised: 6,
      excessPence: 5000,
      isCurrent: true,
    });
    const audit = await auditOf(practice, saved.id);
    expect(audit.map((a) => a.action)).toEqual(["patient.registered"]);
    const found = await listPatients(desk(), { search: "sersha o dal" });
    expect(found.rows.map((row) => row.id)).toEqual([saved.id]);
  });

  test("once, however often the form is sent", async () => {
    const ctx = contextFor(practice, "receptionist", { idempotencyKey: newId() });
    const form = answers();
    const [first, second] = [await registerPatient(ctx, form), await registerPatient(ctx, form)];
    expect(second).toEqual(first);
  });
});

describe("what is missing or wrong is said beside its field", () => {
  test("all at once", async () => {
    const form = {
      ...answers(),
      givenName: " ",
      phone: "",
      email: "",
      nhsNumber: "123",
      bornOn: "1963-02-30",
    };
    await expect(registerPatient(desk(), form)).rejects.toMatchObject({
      code: "invalid",
      fields: expect.arrayContaining([
        { field: "givenName", message: "Enter the given name." },
        { field: "bornOn", message: "Enter the date of birth as day, month and year." },
        { field: "phone", message: "Enter a phone number, or tick that there is none." },
        { field: "email", message: "Enter an e-mail address, or choose another way to reach the patient." },
        expect.objectContaining({ field: "nhsNumber" }),
      ]),
    });
  });

  test.each([
    ["a date of birth ahead", { bornOn: "2026-12-02" }, "bornOn"],
    ["a date of birth too long ago", { bornOn: "1890-01-01" }, "bornOn"],
  ])("%s", async (_, values, field) => {
    await expect(registerPatient(desk(), answers(values))).rejects.toMatchObject({
      code: "refused",
      fields: [expect.objectContaining({ field })],
    });
  });

  test("a patient reached by post needs no e-mail, but an address", async () => {
    const byPost = { email: "", preferredChannel: "post" as const };
    await expect(registerPatient(desk(), answers(byPost))).rejects.toMatchObject({
      fields: [expect.objectContaining({ field: "addressLines" })],
    });
    const saved = await registerPatient(desk(), answers({ ...byPost, addressLines: ["1 Kelp Street"] }));
    expect((await rowOf(saved.id))?.email).toBeNull();
  });
});

describe("a possible duplicate is shown before it is saved", () => {
  test.each([
    ["the same names and date of birth", { givenName: "Eleri", familyName: "Tamworth" }, ["born-and-name"]],
    ["names the other way round", { givenName: "Tamworth", familyName: "Eleri" }, ["born-and-name"]],
    ["a slip in the family name", { givenName: "Eleri", familyName: "Tamworht" }, ["born-and-name"]],
    ["the same phone", { phone: "07700900731" }, ["phone"]],
    ["the same NHS number", { nhsNumber: "9993142786" }, ["nhs-number"]],
  ])("for %s", async (_, values, reasons) => {
    const crowd = await buildPractice();
    const known = await addPatient(crowd, {
      givenName: "Eleri",
      familyName: "Tamworth",
      bornOn: "1963-06-22",
      phone: "+447700900731",
      nhsNumber: "9993142786",
    });
    const ctx = contextFor(crowd, "receptionist");
    const form = answers({ bornOn: "1963-06-22", ...values });
    await expect(registerPatient(ctx, form)).rejects.toMatchObject({
      code: "refused",
      kind: "possible-duplicate",
      detail: { candidates: [{ id: known.id, name: "Eleri Tamworth", reasons }] },
    });
    const saved = await registerPatient(ctx, { ...form, isSomeoneElse: true });
    expect(saved.id).not.toBe(known.id);
  });

  test("but not for a stranger of the same day, nor for another practice's patient", async () => {
    await addPatient(other, { givenName: "Jory", familyName: "Pask", bornOn: "1950-05-05" });
    await addPatient(practice, { givenName: "Wenna", familyName: "Trelawne", bornOn: "1950-05-05" });
    const saved = await registerPatient(
      desk(),
      answers({ givenName: "Jory", familyName: "Pask", bornOn: "1950-05-05" }),
    );
    expect(saved.name).toBe("Jory Pask");
  });
});

describe("nothing from elsewhere", () => {
  test("another practice's surgery, site, therapist or payer is not found", async () => {
    const foreign = [
      { gpPracticeId: other.gpPractices.surgery.id },
      { homeSiteId: other.sites.saltgate.id },
      { usualTherapistId: other.staff.therapist.id },
      { payer: { payerId: other.payers.insurer.id } },
    ];
    for (const values of foreign)
      await expect(registerPatient(desk(), answers(values))).rejects.toMatchObject({ code: "not-found" });
  });

  test("accounts may not register", async () => {
    await expect(registerPatient(contextFor(practice, "accounts"), answers())).rejects.toMatchObject({
      code: "forbidden",
    });
  });
});
