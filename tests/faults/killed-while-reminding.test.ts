import { newId } from "@withy/core/ids";
import { outboxMessages, practices } from "@withy/db/schema";
import { cancelAppointment, sendDueReminders } from "@withy/services/diary";
import { drainOutbox } from "@withy/services/messaging";
import { and, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { officeWith, recordingMail } from "../integration/messaging/outbox-support";
import { contextFor, systemContextFor } from "../support/contexts";
import { addAppointment } from "../support/diary-rows";
import { addPatient } from "../support/people";
import { buildPractice, type TestPractice } from "../support/practice";
import { Killed, mortalDatabase } from "./killed-worker";

/** Numbers that look random and are the same in every run. */
function randomFrom(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((state / 2 ** 32) * below);
  };
}

type Mail = ReturnType<typeof recordingMail>;

/** One worker's life: it reminds and sends until it is killed at some statement, or in the middle of a sending. */
async function liveAndDie(
  practice: TestPractice,
  mail: Mail,
  random: (below: number) => number,
): Promise<boolean> {
  // Other suites' practices stand in the same database and cost each round a statement or two.
  const others = await practice.db.$count(practices);
  const mortal = mortalDatabase(random(30 + 2 * others), random(2) === 0);
  const ctx = { ...systemContextFor(practice), db: mortal.db };
  const diesAfterMail = random(6) === 0;
  const gateway = {
    ...mail,
    async send(one: Parameters<Mail["send"]>[0]) {
      const answer = await mail.send(one);
      return diesAfterMail ? mortal.die() : answer;
    },
  };
  try {
    await sendDueReminders(ctx);
    await drainOutbox(ctx, { ...officeWith(mail), mail: gateway, batch: 5 });
  } catch (error) {
    if (!mortal.isDead() && !(error instanceof Killed)) throw error;
  } finally {
    await mortal.bury();
  }
  return mortal.isDead();
}

const remindersIn = (practice: TestPractice) =>
  practice.db
    .select()
    .from(outboxMessages)
    .where(
      and(eq(outboxMessages.practiceId, practice.practiceId), eq(outboxMessages.template, "visit-reminder")),
    );

async function bookVisits(practice: TestPractice) {
  const visits: Awaited<ReturnType<typeof addAppointment>>[] = [];
  for (const [n, time] of [
    "09:00",
    "09:40",
    "10:20",
    "11:00",
    "13:00",
    "13:40",
    "14:20",
    "15:00",
  ].entries()) {
    const patient = await addPatient(practice, { email: `visit${n}.${newId().slice(-6)}@post.example` });
    visits.push(await addAppointment(practice, { patientId: patient.id, day: "2026-12-08", time }));
  }
  return visits;
}

it.each([11, 42, 1994])(
  "killed at random, a worker loses no reminder, sends none twice and none after a cancellation (%i)",
  async (seed) => {
    const random = randomFrom(seed);
    const practice = await buildPractice();
    const mail = recordingMail();
    const visits = await bookVisits(practice);
    const cancelled = new Map<string, number>();
    practice.clock.set("2026-12-07T15:30:00Z");
    let deaths = 0;
    for (let life = 0; life < 40; life += 1) {
      deaths += (await liveAndDie(practice, mail, random)) ? 1 : 0;
      const victim = visits[random(visits.length)];
      if (victim && cancelled.size < 3 && random(8) === 0 && !cancelled.has(victim.id)) {
        await cancelAppointment(contextFor(practice, "receptionist"), {
          appointmentId: victim.id,
          version: 1,
          by: "patient",
          reason: "Away",
        });
        cancelled.set(victim.id, mail.sent.length);
      }
      practice.clock.advance(random(3) === 0 ? 6 : 1);
    }
    // One that lives: what was left in the hands of the dead is given back after five minutes.
    for (let n = 0; n < 4; n += 1) {
      practice.clock.advance(6);
      await sendDueReminders(systemContextFor(practice));
      while ((await drainOutbox(systemContextFor(practice), officeWith(mail))) > 0);
    }
    const rows = await remindersIn(practice);
    expect(new Set(rows.map((row) => row.dedupeKey)).size).toBe(rows.length);
    for (const visit of visits) {
      const own = rows.filter((row) => row.aboutId === visit.id);
      const ids = new Set(own.map((row) => row.id));
      const places = mail.sent.flatMap((one, place) => (ids.has(one.id) ? [place] : []));
      const since = cancelled.get(visit.id);
      if (since === undefined) {
        // A mail that went out with its worker goes again under the same Message-ID, which readers show once.
        expect(own.map((row) => row.state)).toEqual(["sent"]);
        expect(new Set(places.map((place) => mail.sent[place]?.id)).size).toBe(1);
      } else expect(places.filter((place) => place >= since)).toEqual([]);
    }
    expect(cancelled.size).toBeGreaterThan(0);
    expect(deaths).toBeGreaterThan(5);
  },
  60_000,
);
