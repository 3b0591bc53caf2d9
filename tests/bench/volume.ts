import type { Connection } from "mysql2/promise";
import { stepMinutes, type VolumePlan, visitsADay, volumeId, volumeIdSql, weeksAhead } from "./volume-plan";

const beginnings = [
  "Ald",
  "Bar",
  "Cor",
  "Dun",
  "Eth",
  "Far",
  "Gar",
  "Hol",
  "Ick",
  "Jan",
  "Kel",
  "Lan",
  "Mor",
  "Nan",
  "Orm",
  "Pen",
  "Quar",
  "Ros",
  "San",
  "Tre",
];
const middles = [
  "a",
  "e",
  "i",
  "o",
  "u",
  "ae",
  "or",
  "en",
  "ur",
  "is",
  "and",
  "el",
  "ing",
  "ow",
  "ar",
  "ith",
  "on",
  "ell",
  "um",
  "ay",
];
const ends = [
  "by",
  "cote",
  "dale",
  "ford",
  "garth",
  "ham",
  "keld",
  "ley",
  "mere",
  "ness",
  "port",
  "rick",
  "stow",
  "thorpe",
  "ton",
  "veor",
  "wick",
  "worth",
  "yeo",
  "zance",
];
const given = [
  "Agnes",
  "Ben",
  "Carys",
  "Dev",
  "Elowen",
  "Fergus",
  "Ginny",
  "Hugo",
  "Iona",
  "Jago",
  "Kit",
  "Lena",
  "Mabel",
  "Noel",
  "Osian",
  "Priya",
  "Ravi",
  "Sian",
  "Toby",
  "Una",
];

const choose = (list: readonly string[], index: string) =>
  `ELT(1 + MOD(${index}, ${list.length}), ${list.map((word) => `'${word}'`).join(", ")})`;
const family = (n: string) =>
  `CONCAT(${choose(beginnings, n)}, ${choose(middles, `${n} DIV 20`)}, ${choose(ends, `${n} DIV 400`)}, ${choose(ends, `${n} DIV 8000`)})`;

/** Fills an empty, migrated database with one practice of the planned size, by statements that make rows in bulk. */
export async function fillVolume(connection: Connection, plan: VolumePlan): Promise<void> {
  await connection.query("SET SESSION foreign_key_checks = 0, unique_checks = 0");
  const p = volumeId("practice", 1);
  const run = (sql: string) => connection.query(sql);
  await run(`INSERT INTO practices (id, name, legal_name, address_lines, postcode, phone, email, invoice_prefix, created_at)
    VALUES ('${p}', 'Many Rooms', 'Many Rooms Ltd', '["1 Long Street"]', 'ZZ1 1AA', '+441632960001', 'post@rooms.example', 'MR', UTC_TIMESTAMP(3))`);
  const n = "(seq - 1)";
  await run(`INSERT INTO sites (practice_id, id, name, address_lines, postcode, phone, position, created_at)
    SELECT '${p}', ${volumeIdSql("site", n)}, CONCAT('Site ', seq), '["1 Long Street"]', 'ZZ1 1AA', '+441632960001', seq, UTC_TIMESTAMP(3) FROM seq_1_to_${plan.sites}`);
  await run(`INSERT INTO site_hours (practice_id, site_id, weekday, opens_at, closes_at)
    SELECT '${p}', ${volumeIdSql("site", "s.seq - 1")}, d.seq, '08:00', '19:00' FROM seq_1_to_${plan.sites} s, seq_1_to_5 d`);
  const siteOfPerson = volumeIdSql("site", `MOD(${n}, ${plan.sites})`);
  await run(`INSERT INTO rooms (practice_id, id, site_id, name, position)
    SELECT '${p}', ${volumeIdSql("room", n)}, ${siteOfPerson}, CONCAT('Room ', seq), seq FROM seq_1_to_${plan.therapists}`);
  await run(`INSERT INTO staff_members (practice_id, id, given_name, family_name, job_title, registration_number, is_therapist, home_site_id, position, created_at)
    SELECT '${p}', ${volumeIdSql("member", n)}, ${choose(given, n)}, ${family("seq * 37")}, 'physiotherapist', CONCAT('PH', 100000 + seq), 1, ${siteOfPerson}, seq, UTC_TIMESTAMP(3) FROM seq_1_to_${plan.therapists}`);
  await run(`INSERT INTO staff_roles (practice_id, id, staff_member_id, role)
    SELECT '${p}', ${volumeIdSql("role", n)}, ${volumeIdSql("member", n)}, IF(seq = 1, 'owner', 'therapist') FROM seq_1_to_${plan.therapists}`);
  // The owner treats too, so that one sign-in reaches every page.
  await run(
    `INSERT INTO staff_roles (practice_id, id, staff_member_id, role) VALUES ('${p}', UUID(), '${volumeId("member", 0)}', 'therapist')`,
  );
  await run(
    `INSERT INTO services (practice_id, id, name, kind, duration_minutes) VALUES ('${p}', '${volumeId("service", 1)}', 'Follow-up', 'follow-up', 30)`,
  );
  await run(`INSERT INTO service_therapists (practice_id, service_id, staff_member_id)
    SELECT '${p}', '${volumeId("service", 1)}', ${volumeIdSql("member", n)} FROM seq_1_to_${plan.therapists}`);
  await run(`INSERT INTO working_patterns (practice_id, id, staff_member_id, site_id, weekday, starts_at, ends_at, breaks, valid_from)
    SELECT '${p}', ${volumeIdSql("pattern", `(s.seq - 1) * 5 + d.seq`)}, ${volumeIdSql("member", "s.seq - 1")}, ${volumeIdSql("site", `MOD(s.seq - 1, ${plan.sites})`)}, d.seq, '08:00', '18:00', '[]', '2020-01-06'
      FROM seq_1_to_${plan.therapists} s, seq_1_to_5 d`);
  await fillPatients(connection, plan, p);
  await fillDiary(connection, plan, p);
  await connection.query("ANALYZE TABLE appointments, patients, diary_claims");
}

async function fillPatients(connection: Connection, plan: VolumePlan, p: string): Promise<void> {
  const n = "(seq - 1)";
  const phone = "CONCAT('+447700900', LPAD(seq * 37 % 1000, 3, '0'))";
  await connection.query(`INSERT INTO patients (practice_id, id, given_name, family_name, born_on, phone, email, address_lines, postcode, nhs_number, home_site_id, name_last_first, name_first_last, phone_reversed, created_at, updated_at)
    SELECT '${p}', ${volumeIdSql("patient", n)}, ${choose(given, n)}, ${family(n)}, DATE_ADD('1935-01-01', INTERVAL seq * 13 % 28000 DAY), ${phone}, CONCAT('p', seq, '@post.example'),
      '["2 Short Street"]', 'ZZ1 1AB', CONCAT('999', LPAD(seq, 7, '0')), ${volumeIdSql("site", `MOD(${n}, ${plan.sites})`)},
      LOWER(CONCAT(${family(n)}, ' ', ${choose(given, n)})), LOWER(CONCAT(${choose(given, n)}, ' ', ${family(n)})), REVERSE(SUBSTR(${phone}, 2)), UTC_TIMESTAMP(3), UTC_TIMESTAMP(3)
    FROM seq_1_to_${plan.patients}`);
}

/** Weekdays back from eight weeks ahead; each therapist in a room of their own, so nothing can overlap. */
async function fillDiary(connection: Connection, plan: VolumePlan, p: string): Promise<void> {
  const n = "(seq - 1)";
  const therapist = `MOD(${n}, ${plan.therapists})`;
  const slot = `MOD(${n} DIV ${plan.therapists}, ${visitsADay})`;
  const dayBack = `(${n} DIV ${plan.therapists * visitsADay})`;
  const lastMonday = `DATE_ADD(DATE_SUB(UTC_DATE(), INTERVAL WEEKDAY(UTC_DATE()) DAY), INTERVAL ${weeksAhead} WEEK)`;
  const day = `DATE_ADD(DATE_SUB(${lastMonday}, INTERVAL ${dayBack} DIV 5 WEEK), INTERVAL 4 - MOD(${dayBack}, 5) DAY)`;
  const startsAt = `DATE_ADD(${day}, INTERVAL 480 + ${slot} * ${stepMinutes} MINUTE)`;
  const perStatement = 250_000;
  for (let from = 1; from <= plan.appointments; from += perStatement) {
    const to = Math.min(plan.appointments, from + perStatement - 1);
    await connection.query(`INSERT INTO appointments (practice_id, id, site_id, therapist_id, room_id, patient_id, service_id, starts_at, ends_at, state, created_at, created_by, updated_at)
      SELECT '${p}', ${volumeIdSql("appointment", n)}, ${volumeIdSql("site", `MOD(${therapist}, ${plan.sites})`)}, ${volumeIdSql("member", therapist)}, ${volumeIdSql("room", therapist)},
        ${volumeIdSql("patient", `MOD(${n} * 7919, ${plan.patients})`)}, '${volumeId("service", 1)}', ${startsAt}, DATE_ADD(${startsAt}, INTERVAL 30 MINUTE),
        IF(${startsAt} < UTC_TIMESTAMP(), 'fulfilled', 'booked'), UTC_TIMESTAMP(3), '${volumeId("member", 0)}', UTC_TIMESTAMP(3)
      FROM seq_${from}_to_${to}`);
  }
  for (const resource of ["therapist_id", "room_id"]) {
    await connection.query(`INSERT INTO diary_claims (practice_id, resource_id, slot_at, appointment_id)
      SELECT a.practice_id, a.${resource}, DATE_ADD(a.starts_at, INTERVAL 5 * (s.seq - 1) MINUTE), a.id
      FROM appointments a, seq_1_to_6 s WHERE a.starts_at > DATE_SUB(UTC_TIMESTAMP(), INTERVAL 60 DAY)`);
  }
}
