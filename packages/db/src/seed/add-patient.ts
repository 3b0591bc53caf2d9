import { nhsCheckDigit } from "@withy/core/identifiers/nhs-number";
import { foldName } from "@withy/core/names";
import { addDays } from "@withy/core/zoned-time";
import { consents, patientAlerts, patientPayers, patients } from "../schema";
import { type CastMember, familyNames, givenNames } from "./scenario/names";
import { streets, towns } from "./scenario/places";
import type { House, PatientRow, PersonRow, SiteRow, Stage } from "./stage";

const needs = [
  "Hard of hearing, speak clearly and face to face",
  "Reads large print",
  "Welsh first, English well",
  "Comes with his daughter, who drives",
  "Needs the ramp",
];
const deskAlerts = [
  "Ring, do not text",
  "Prefers the ground floor room",
  "Often ten minutes late, the bus",
  "Pays for her sister too, ask which",
];
const clinicalAlerts = [
  "Anticoagulant. Ask before any hands-on technique",
  "Latex allergy",
  "Diabetes, type 1. Carries glucose",
  "Faints when lying down fast",
  "Pacemaker",
];

export interface NewPatient {
  site: SiteRow;
  therapist: PersonRow;
  since: Date;
  cast?: CastMember;
}

/** Keeps counters across patients, so that no phone, address or NHS number comes twice. */
export function makePatients(stage: Stage, house: House) {
  let made = 0;
  let nhsBase = 999_000_100;
  const nextNhsNumber = (): string => {
    for (;;) {
      nhsBase += 7;
      const base = String(nhsBase);
      const check = nhsCheckDigit(base);
      if (check !== null) return `${base}${check}`;
    }
  };
  return (wish: NewPatient): PatientRow => {
    made += 1;
    const patient = patientRow(stage, house, wish, made, stage.random.chance(0.8) ? nextNhsNumber() : null);
    stage.rows.add(patients, patient);
    addAround(stage, house, patient, wish.since);
    return patient;
  };
}

const slug = (text: string) => foldName(text).replace(/[^a-z]+/g, "");

function patientRow(
  stage: Stage,
  house: House,
  { site, therapist, since, cast }: NewPatient,
  made: number,
  nhsNumber: string | null,
): PatientRow {
  const { random, newId } = stage;
  const sex = cast?.sex ?? (random.chance(0.56) ? "female" : "male");
  const given = cast?.given ?? random.pick(givenNames[sex]);
  const family = cast?.family ?? random.pick(familyNames);
  const surgery = random.pick(house.surgeries);
  const phone = random.chance(0.88)
    ? `+447700900${String(made % 1000).padStart(3, "0")}`
    : `+441632960${String(made % 1000).padStart(3, "0")}`;
  const bornOn =
    cast?.bornOn ??
    addDays(stage.today, -Math.round(365.25 * (17 + 66 * Math.sqrt(random.next()))) - random.int(0, 364));
  return {
    practiceId: house.practiceId,
    id: newId(),
    givenName: given,
    familyName: family,
    preferredName: random.chance(0.06) ? given.slice(0, 3) : null,
    bornOn,
    sex,
    phone,
    email: random.chance(0.9) ? `${slug(given)}.${slug(family)}${made}@post.example` : null,
    addressLines: [`${random.int(1, 90)} ${random.pick(streets)}`, random.pick(towns)],
    postcode: `ZZ${random.int(1, 9)} ${random.int(1, 9)}${random.pick(["AB", "DE", "GH", "JL", "NP", "QR", "TU", "XY"])}`,
    nhsNumber,
    gpPracticeId: surgery.row.id,
    gpName: random.pick(surgery.doctors),
    communicationNeeds: random.chance(0.07) ? random.pick(needs) : null,
    preferredChannel: random.pick(["email", "email", "text", "text", "phone"] as const),
    nextOfKin: random.chance(0.3)
      ? `${random.pick(givenNames[random.chance(0.5) ? "female" : "male"])} ${family}, ${random.pick(["partner", "brother", "sister", "daughter", "son"])}`
      : null,
    homeSiteId: site.id,
    usualTherapistId: therapist.id,
    nameLastFirst: foldName(`${family} ${given}`),
    nameFirstLast: foldName(`${given} ${family}`),
    phoneReversed: [...phone.slice(1)].reverse().join(""),
    createdAt: since,
    updatedAt: since,
  };
}

/** Who pays, what was agreed to, and what must be seen before anyone acts. */
function addAround({ random, rows, newId }: Stage, house: House, patient: PatientRow, since: Date): void {
  const { practiceId, id: patientId } = patient;
  const recordedBy = random.pick(house.desk).id;
  const agreed = (["treatment", "letter-to-gp", "email", "text"] as const).filter(
    (kind) => kind === "treatment" || random.chance(0.85),
  );
  rows.add(
    consents,
    ...agreed.map((kind) => ({
      practiceId,
      id: newId(),
      patientId,
      kind,
      wordingVersion: kind === "treatment" ? "4" : "2",
      givenAt: since,
      recordedBy,
    })),
  );
  if (random.chance(0.08))
    rows.add(patientAlerts, {
      practiceId,
      id: newId(),
      patientId,
      text: random.pick(clinicalAlerts),
      isClinical: true,
      createdAt: since,
      createdBy: recordedBy,
    });
  if (random.chance(0.06))
    rows.add(patientAlerts, {
      practiceId,
      id: newId(),
      patientId,
      text: random.pick(deskAlerts),
      createdAt: since,
      createdBy: recordedBy,
    });
  if (!random.chance(0.3)) return;
  const payer = random.pick(house.payers);
  rows.add(patientPayers, {
    practiceId,
    id: newId(),
    patientId,
    payerId: payer.id,
    policyNumber: `${payer.name.slice(0, 2).toUpperCase()}-${random.int(100_000, 999_999)}`,
    authorisationCode: random.chance(0.9) ? `A${random.int(10_000, 99_999)}` : null,
    sessionsAuthorised: random.pick([4, 6, 8]),
    excessPence: random.chance(0.3) ? 10_000 : 0,
    createdAt: since,
  });
}
