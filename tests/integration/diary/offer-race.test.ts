import { isAppError } from "@withy/core/errors";
import { addDays, weekdayOf } from "@withy/core/zoned-time";
import { connect } from "@withy/db/client";
import { appointments, auditEvents } from "@withy/db/schema";
import { bankHolidayOn } from "@withy/diary/bank-holidays";
import { answerOffer, offerTime, settleOffers, stopOfferRound } from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor, systemContextFor } from "../../support/contexts";
import { claimsOf } from "../../support/diary-rows";
import { buildPractice, type TestPractice } from "../../support/practice";
import {
  addWaiting,
  entryOf,
  everything,
  messagesOf,
  offersOf,
  openRound,
  roundOf,
  startOn,
  tokenOf,
} from "./offer-steps";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

const kindOf = (work: Promise<unknown>): Promise<string> =>
  work.then(
    () => "done",
    (error) => {
      if (!isAppError(error)) throw error;
      return error.kind;
    },
  );

/** So many offers of one time; a round asks at most twenty, so several rounds for starts that overlap. */
async function manyOffers() {
  const clocks = ["10:00", "10:10", "10:20"];
  const rounds = [];
  for (const [n, clock] of clocks.entries())
    rounds.push(await openRound(practice, { day: "2026-12-08", time: clock, people: n === 2 ? 10 : 20 }));
  return rounds;
}

describe("fifty acceptances at once", () => {
  it("over connections of their own: exactly one has the time, everyone else is told, claims and audit are right", {
    timeout: 120_000,
  }, async () => {
    const rounds = await manyOffers();
    const tokens = rounds.flatMap((one) => one.tokens);
    expect(tokens).toHaveLength(50);
    const connections = tokens.map(() => connect(process.env["DATABASE_URL"] ?? "", { connectionLimit: 1 }));
    try {
      const answers = await Promise.all(
        tokens.map((token, n) =>
          kindOf(
            answerOffer(
              { ...systemContextFor(practice), db: connections[n]?.db ?? practice.db },
              token,
              "accept",
            ),
          ),
        ),
      );
      expect(answers.filter((one) => one === "done")).toHaveLength(1);
      expect(answers.filter((one) => one === "offer-gone")).toHaveLength(49);
    } finally {
      await Promise.all(connections.map((one) => one.close()));
    }
    await settleOffers(systemContextFor(practice));
    const visits = await practice.db
      .select()
      .from(appointments)
      .where(eq(appointments.practiceId, practice.practiceId));
    expect(visits).toHaveLength(1);
    const { claims } = await everything(practice);
    expect(claims).toHaveLength(visits.flatMap(claimsOf).length);
    const booked = await practice.db
      .select()
      .from(auditEvents)
      .where(
        and(eq(auditEvents.practiceId, practice.practiceId), eq(auditEvents.action, "appointment.booked")),
      );
    expect(booked.map((a) => a.subjectId)).toEqual([visits[0]?.id]);
    const ended = await Promise.all(rounds.map(({ roundId }) => roundOf(practice, roundId)));
    expect(ended.filter((one) => one.state === "taken")).toHaveLength(1);
  });

  it("in one round: one wins, nineteen get a kind note, once each", { timeout: 60_000 }, async () => {
    const { tokens, offers, roundId } = await openRound(practice, {
      day: "2026-12-09",
      time: "10:00",
      people: 20,
    });
    const answers = await Promise.all(
      tokens.map((token) => kindOf(answerOffer(systemContextFor(practice), token, "accept"))),
    );
    expect(answers.filter((one) => one === "done")).toHaveLength(1);
    expect((await offersOf(practice, roundId)).filter((o) => o.state === "lost")).toHaveLength(19);
    const notes = await Promise.all(
      offers.map(async ({ id }) => (await messagesOf(practice, id, "offer-gone")).length),
    );
    expect(notes.reduce((sum, n) => sum + n, 0)).toBe(19);
    expect(Math.max(...notes)).toBe(1);
  });

  it("of one link, pressed twenty times: booked once", async () => {
    const { tokens } = await openRound(practice, { day: "2026-12-10", time: "10:00", people: 1 });
    const presses = Array.from({ length: 20 }, () =>
      kindOf(answerOffer(systemContextFor(practice), tokens[0] ?? "", "accept")),
    );
    const answers = await Promise.all(presses);
    expect(answers.filter((one) => one === "done")).toHaveLength(1);
    expect(answers.filter((one) => one === "offer-yours")).toHaveLength(19);
  });
});

/** Mulberry32: the same rounds on every run. */
function randomOf(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) % below;
  };
}

type Model = { round: string; offers: string[] };
type Act = { kind: "accept" | "decline" | "stop" | "expire" | "sweep"; who: number };

const leftOver: Record<string, string> = { taken: "lost", stopped: "stopped", expired: "expired" };
const endModel = (model: Model, state: string): void => {
  model.round = state;
  model.offers = model.offers.map((o) => (o === "open" ? (leftOver[state] ?? o) : o));
};

/** What should come of an act, told without the database. `isOver`: the clock is past the offer's time. */
function foretell(model: Model, act: Act, isOver: boolean): string {
  if (act.kind === "stop") {
    if (model.round !== "open") return "wrong-state";
    endModel(model, "stopped");
    return "done";
  }
  if (act.kind === "sweep") {
    if (model.round === "open" && isOver) endModel(model, "expired");
    return "done";
  }
  if (act.kind === "expire") return "done";
  const own = model.offers[act.who] ?? "";
  const told: Record<string, string> = {
    accepted: "yours",
    declined: "declined",
    lost: "gone",
    stopped: "stopped",
    expired: "expired",
  };
  if (own !== "open") return `offer-${told[own]}`;
  if (isOver) return "offer-expired";
  model.offers[act.who] = act.kind === "accept" ? "accepted" : "declined";
  if (act.kind === "accept") endModel(model, "taken");
  else if (!model.offers.includes("open")) endModel(model, "expired");
  return "done";
}

describe("a hundred rounds of accept, decline, stop and expire in any order", () => {
  it("come out as a simple model says, act by act", { timeout: 300_000 }, async () => {
    const house = await buildPractice();
    const random = randomOf(20_261_201);
    const people = [];
    for (let n = 0; n < 4; n += 1) people.push(await addWaiting(house));
    let booked = 0;
    // A working day of its own for each, so that no round meets the visit of another.
    let played = 0;
    for (let day = "2026-12-07"; played < 100; day = addDays(day, 1)) {
      if (weekdayOf(day) > 5 || bankHolidayOn("england", day)) continue;
      booked += await playRound(house, people, day, random);
      played += 1;
    }
    expect(booked).toBeGreaterThan(20);
    const { visits, claims } = await everything(house);
    expect(visits).toHaveLength(booked);
    expect(claims).toHaveLength(visits.flatMap(claimsOf).length);
  });
});

async function playRound(
  house: TestPractice,
  people: Awaited<ReturnType<typeof addWaiting>>[],
  day: string,
  random: (below: number) => number,
): Promise<number> {
  for (let i = 0; i < people.length; i += 1)
    if ((await entryOf(house, people[i]?.entry.id ?? "")).state !== "waiting")
      people[i] = await addWaiting(house);
  const desk = contextFor(house, "receptionist");
  const size = 1 + random(people.length);
  const startsAt = startOn(house, day, "10:15");
  const { roundId } = await offerTime(desk, {
    ...{ siteId: house.sites.saltgate.id, therapistId: house.staff.therapist.id, startsAt, minutes: 60 },
    entryIds: people.slice(0, size).map(({ entry }) => entry.id),
  });
  const opened = house.clock.now();
  const tokens = [];
  for (const { id } of await offersOf(house, roundId)) tokens.push(await tokenOf(house, id));
  const model: Model = { round: "open", offers: tokens.map(() => "open") };
  const acts = 2 + random(6);
  for (let n = 0; n < acts; n += 1) {
    const dice = random(12);
    const who = random(size);
    const act: Act =
      dice < 3
        ? { kind: "accept", who }
        : dice < 8
          ? { kind: "decline", who }
          : { kind: (["stop", "expire", "sweep", "sweep"] as const)[dice - 8] ?? "sweep", who };
    if (act.kind === "expire") house.clock.advance(45);
    const isOver = house.clock.now().getTime() >= opened.getTime() + 60 * 60_000;
    const expected = foretell(model, act, isOver);
    const system = systemContextFor(house);
    if (act.kind === "stop")
      expect(await kindOf(stopOfferRound(desk, { roundId, version: 1 }))).toBe(expected);
    else if (act.kind === "sweep") await settleOffers(system);
    else if (act.kind !== "expire")
      expect(await kindOf(answerOffer(system, tokens[act.who] ?? "", act.kind))).toBe(expected);
    expect([
      (await roundOf(house, roundId)).state,
      (await offersOf(house, roundId)).map((o) => o.state),
    ]).toEqual([model.round, model.offers]);
  }
  // Whatever is left open is stopped, so that everyone may be asked again.
  if (model.round === "open") await stopOfferRound(desk, { roundId, version: 1 });
  return model.round === "taken" ? 1 : 0;
}
