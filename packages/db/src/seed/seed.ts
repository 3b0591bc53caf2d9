import { addDays, dayOf, instantAt } from "@withy/core/zoned-time";
import { getTableName } from "drizzle-orm";
import type { Connection } from "mysql2/promise";
import { absences, episodes, practices } from "../schema";
import { addDiary } from "./add-diary";
import { addHouse } from "./add-house";
import { addLetters } from "./add-letters";
import { addMeasures } from "./add-measures";
import { type Books, planBooks, writeBooks } from "./add-money";
import { addNotes } from "./add-notes";
import { addProgrammes } from "./add-programmes";
import { addTrail } from "./add-trail";
import { addWaiting } from "./add-waiting";
import { planEleri, tellEleri, wordsOfEleri } from "./eleri";
import { type Leave, planDiary } from "./plan-diary";
import { makeIds, makeRandom } from "./random";
import { cairnFirth } from "./scenario/cairn-firth";
import { marram } from "./scenario/marram";
import type { PracticePlan } from "./scenario/practice-plan";
import { SeedRows } from "./seed-rows";
import type { House, Stage } from "./stage";
import { makeWorkingDays } from "./working-day";

const zone = "Europe/London";

/** Whether anyone works with this database already. */
export async function isSeeded(connection: Connection): Promise<boolean> {
  const [rows] = await connection.query("SELECT 1 FROM ?? LIMIT 1", [getTableName(practices)]);
  return (rows as unknown[]).length > 0;
}

/**
 * Writes the two demonstration practices, told from the moment `now`: the same moment gives the same rows.
 * @returns how many rows of which the diary, the records and the books are made
 */
export async function seedDemo(connection: Connection, now: Date): Promise<number> {
  const random = makeRandom(20_261);
  const rows = new SeedRows();
  const newId = makeIds(random, new Date(now.getTime() - 120 * 86_400_000));
  const stage: Stage = { random, newId, rows, now, today: dayOf(now, zone), zone };
  const books = [marram, cairnFirth].map((plan) => tell(stage, plan));
  await connection.beginTransaction();
  const written = await rows.write(connection);
  for (const one of books) await writeBooks(connection, one);
  await connection.commit();
  return (
    written +
    books.reduce(
      (sum, one) => sum + one.drafts.length + one.lines.length + one.payments.length + one.refunds.length,
      0,
    )
  );
}

function tell(stage: Stage, plan: PracticePlan): Books {
  const house = addHouse(stage, plan);
  const eleri = plan === marram ? planEleri(stage, house, makeWorkingDays(stage, house)) : null;
  const leave = planLeave(stage, house);
  const { visits, courses } = planDiary(stage, house, eleri?.fixed ?? [], leave);
  addDiary(stage, house, courses, visits);
  const noteOf = addNotes(
    stage,
    house,
    courses,
    eleri ? { course: eleri.course, words: wordsOfEleri } : null,
  );
  const others = courses.filter((course) => course !== eleri?.course);
  addMeasures(stage, house, others, noteOf);
  addProgrammes(stage, house, others);
  if (eleri) tellEleri(stage, house, eleri.course, noteOf);
  const endedOn = new Map(
    stage.rows.of(episodes).flatMap((row) => (row.dischargedAt ? [[row.id, row.dischargedAt] as const] : [])),
  );
  addLetters(stage, house, courses, endedOn);
  const books = planBooks(stage, house, courses);
  addTrail(stage, house, visits, books);
  addWaiting(stage, house, courses);
  return books;
}

/** A week off for two people and a blocked hour, so that the diary has what a real one has. */
function planLeave({ rows, newId, today, zone: at, now }: Stage, house: House): Leave[] {
  const createdBy =
    house.people.find((person) => person.plan.roles.some(([role]) => role === "owner"))?.id ?? "";
  const off = house.therapists
    .slice(-2)
    .map((person, i) => ({ person, from: addDays(today, i === 0 ? 9 : -30), days: 6 }));
  rows.add(
    absences,
    ...off.map(({ person, from, days }) => ({
      practiceId: house.practiceId,
      id: newId(),
      staffMemberId: person.id,
      kind: "leave" as const,
      reason: "Annual leave",
      createdBy,
      startsAt: instantAt(from, "00:00", at) ?? now,
      endsAt: instantAt(addDays(from, days + 1), "00:00", at) ?? now,
    })),
  );
  return off.map(({ person, from, days }) => ({ therapistId: person.id, from, to: addDays(from, days) }));
}
