import { newId } from "@withy/core/ids";
import { foldName } from "@withy/core/names";
import { episodes, patientPayers, patients } from "@withy/db/schema";
import type { TestPractice } from "./practice";

let made = 0;

/** A patient of Saltgate with phone, e-mail and surgery, under a name of its own unless one is given. */
export async function addPatient(practice: TestPractice, values: Partial<typeof patients.$inferInsert> = {}) {
  made += 1;
  const number = String(made).padStart(3, "0").slice(-3);
  const phone = values.phone === undefined ? `+447700900${number}` : values.phone;
  const [given, family] = [values.givenName ?? "Perran", values.familyName ?? `Oake ${made}`];
  const now = practice.clock.now();
  const patient = {
    practiceId: practice.practiceId,
    id: newId(),
    givenName: given,
    familyName: family,
    bornOn: "1971-05-14",
    email: `perran.oake${made}@post.example`,
    addressLines: ["3 Net Loft Row", "Easterhaven"],
    postcode: "ZZ1 7GH",
    gpPracticeId: practice.gpPractices.surgery.id,
    gpName: "Dr Ruth Ellery",
    homeSiteId: practice.sites.saltgate.id,
    createdAt: now,
    updatedAt: now,
    ...values,
    phone,
    nameLastFirst: foldName(`${family} ${given}`),
    nameFirstLast: foldName(`${given} ${family}`),
    phoneReversed: phone ? [...phone.replace(/\D/g, "")].reverse().join("") : null,
  };
  await practice.db.insert(patients).values(patient);
  return patient;
}

/** Makes the insurer pay for the patient's visits. */
export async function addInsurance(
  practice: TestPractice,
  patientId: string,
  values: Partial<typeof patientPayers.$inferInsert> = {},
) {
  const row = {
    practiceId: practice.practiceId,
    id: newId(),
    patientId,
    payerId: practice.payers.insurer.id,
    policyNumber: "KW-204417",
    authorisationCode: "AUTH-88",
    sessionsAuthorised: 6,
    createdAt: practice.clock.now(),
    ...values,
  };
  await practice.db.insert(patientPayers).values(row);
  return row;
}

/** An open episode of care with the therapist at Saltgate, for a left hip. */
export async function addEpisode(
  practice: TestPractice,
  patientId: string,
  values: Partial<typeof episodes.$inferInsert> = {},
) {
  const now = practice.clock.now();
  const episode = {
    practiceId: practice.practiceId,
    id: newId(),
    patientId,
    therapistId: practice.staff.therapist.id,
    siteId: practice.sites.saltgate.id,
    problem: "Hip osteoarthritis",
    region: "hip",
    side: "left" as const,
    goals: [],
    redFlags: {},
    openedOn: "2026-11-17",
    createdAt: now,
    updatedAt: now,
    ...values,
  };
  await practice.db.insert(episodes).values(episode);
  return episode;
}
