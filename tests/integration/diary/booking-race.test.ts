import { isAppError } from "@withy/core/errors";
import { addMinutes } from "@withy/core/zoned-time";
import { DatabaseError } from "@withy/db/database-error";
import { appointments, diaryClaims } from "@withy/db/schema";
import { stateFacts } from "@withy/diary/appointment-states";
import { bookAppointment, cancelAppointment, moveAppointment } from "@withy/services/diary";
import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { claimsOf } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

const clients = 40;
const triesEach = 50;
/** The diary is the whole day here, so that luck alone decides what clashes. */
const anyHour = { overrideReason: "Any hour will do" };

let practice: TestPractice;
let patientIds: string[];

beforeAll(async () => {
  practice = await buildPractice();
  patientIds = await Promise.all(Array.from({ length: 20 }, async () => (await addPatient(practice)).id));
});

/** Mulberry32: the same tries on every run, whatever order the database takes them in. */
function randomOf(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) % below;
  };
}

type Answer = "booked" | "moved" | "cancelled" | "taken" | "changed" | "retry";

async function answerOf(work: Promise<unknown>, done: Answer): Promise<Answer> {
  try {
    await work;
    return done;
  } catch (error) {
    if (error instanceof DatabaseError && [1205, 1213].includes(error.errno)) return "retry";
    if (!isAppError(error)) throw error;
    if (error.kind === "slot-taken" || error.kind === "no-room") return "taken";
    if (error.code === "stale" || error.kind === "wrong-state") return "changed";
    throw error;
  }
}

type Seen = { id: string; version: number };

/**
 * One desk that books, moves and cancels at random in four days of two therapists and two rooms.
 * @param open what all desks have booked and not cancelled, as each last saw it
 */
async function client(seed: number, open: Seen[]): Promise<Answer[]> {
  const ctx = contextFor(practice, "owner");
  const random = randomOf(seed);
  const therapists = [practice.staff.therapist.id, practice.staff.owningTherapist.id];
  const rooms = [practice.rooms.saltgateRoom1.id, practice.rooms.saltgateRoom2.id];
  const pick = <T>(list: readonly T[]): T => list[random(list.length)] as T;
  const someTime = (): string =>
    addMinutes(new Date(`2026-12-0${1 + random(4)}T09:00:00Z`), random(80) * 5).toISOString();
  const place = (): object => ({
    therapistId: pick(therapists),
    roomId: pick(rooms),
    startsAt: someTime(),
    ...anyHour,
  });
  const answers: Answer[] = [];
  for (let n = 0; n < triesEach; n += 1) {
    const visit = open.length > 0 ? pick(open) : null;
    const kind = visit === null ? 0 : random(4);
    if (visit === null || kind < 2) {
      const input = {
        patientId: pick(patientIds),
        serviceId: practice.services.followUp.id,
        siteId: practice.sites.saltgate.id,
        ...place(),
      };
      const work = bookAppointment(ctx, input as Parameters<typeof bookAppointment>[1]).then((v) =>
        open.push({ id: v.id, version: v.version }),
      );
      answers.push(await answerOf(work, "booked"));
    } else if (kind === 2) {
      const input = { appointmentId: visit.id, version: visit.version, ...place() } as Parameters<
        typeof moveAppointment
      >[1];
      const work = moveAppointment(ctx, input).then((v) => Object.assign(visit, { version: v.version }));
      answers.push(await answerOf(work, "moved"));
    } else {
      const input = {
        appointmentId: visit.id,
        version: visit.version,
        by: "clinic" as const,
        reason: "Race",
      };
      const work = cancelAppointment(ctx, input).then(() => open.splice(open.indexOf(visit), 1));
      answers.push(await answerOf(work, "cancelled"));
    }
  }
  return answers;
}

describe("forty desks at once", () => {
  it("never book a therapist or a room twice, and every try is answered", { timeout: 240_000 }, async () => {
    const open: Seen[] = [];
    const desks = Array.from({ length: clients }, (_, n) => client(n + 1, open));
    const answers = (await Promise.all(desks)).flat();
    expect(answers).toHaveLength(clients * triesEach);
    const count = (a: Answer): number => answers.filter((x) => x === a).length;
    expect(count("booked")).toBeGreaterThan(50);
    expect(count("taken")).toBeGreaterThan(50);
    expect(count("moved")).toBeGreaterThan(10);
    expect(count("retry")).toBeLessThan(20);

    const rows = await practice.db
      .select()
      .from(appointments)
      .where(eq(appointments.practiceId, practice.practiceId));
    const live = rows.filter((r) => stateFacts[r.state].holdsTime);
    expect(rows).toHaveLength(count("booked"));
    expect(rows.length - live.length).toBe(count("cancelled"));

    const until = (r: (typeof live)[number]): number => addMinutes(r.endsAt, r.cleanDownMinutes).getTime();
    const pairs = live.flatMap((a, n) =>
      live
        .slice(n + 1)
        .filter((b) => a.therapistId === b.therapistId || a.roomId === b.roomId)
        .filter((b) => a.startsAt.getTime() < until(b) && b.startsAt.getTime() < until(a))
        .map((b) => [a.id, b.id]),
    );
    expect(pairs).toEqual([]);

    const held = await practice.db
      .select()
      .from(diaryClaims)
      .where(eq(diaryClaims.practiceId, practice.practiceId));
    const words = (c: {
      resourceId: string;
      slotAt: Date;
      appointmentId?: string | null | undefined;
    }): string => `${c.resourceId} ${c.slotAt.toISOString()} ${c.appointmentId}`;
    expect(held.map(words).sort()).toEqual(live.flatMap(claimsOf).map(words).sort());
  });
});
