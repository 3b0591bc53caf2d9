import { newId } from "@withy/core/ids";
import { weekdayOf } from "@withy/core/zoned-time";
import { absences } from "@withy/db/schema";
import { bookAppointment, findTimes } from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { failureOf, followUp } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;
let patientId: string;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
  patientId = (await addPatient(practice)).id;
  for (const day of ["2026-11-17", "2026-11-24"])
    await addAppointment(practice, { patientId, day, time: "10:00", values: { state: "fulfilled" } });
});

const ask = (more: object = {}, person: "owner" | "receptionist" = "owner") =>
  findTimes(contextFor(practice, person), { serviceId: practice.services.followUp.id, patientId, ...more });

describe("finding a time", () => {
  it("puts the known therapist's soonest time first and says why; it can be booked as it stands", async () => {
    const found = await ask();
    const [first] = found.times;
    expect(first).toMatchObject({
      therapist: { name: "Ana Ferreby" },
      site: { name: "Saltgate" },
      room: { name: "Room 1" },
      day: "2026-12-01",
      startTime: "09:00",
      meetsEveryWish: true,
    });
    expect(first?.reasons).toEqual([
      "Earliest of all",
      "Same therapist as last time, 2 visits so far",
      "Leaves no gap too short to sell",
    ]);
    expect(found.seenBy).toEqual([
      { therapistId: practice.staff.therapist.id, name: "Ana Ferreby", visits: 2, lastOn: "2026-11-24" },
    ]);
    expect(found.none).toBeNull();
    if (!first) throw new Error("No time was found.");
    const { startsAt, therapist, site, room } = first;
    const input = { patientId, serviceId: practice.services.followUp.id, startsAt };
    const ids = { therapistId: therapist.id, siteId: site.id, roomId: room.id };
    const view = await bookAppointment(contextFor(practice, "owner"), { ...input, ...ids });
    expect(view.startTime).toBe("09:00");
    const next = await ask();
    expect(next.times.map((t) => `${t.therapist.name} ${t.day} ${t.startTime}`)).not.toContain(
      "Ana Ferreby 2026-12-01 09:00",
    );
    const moving = await ask({ movingId: view.id });
    expect(moving.times[0]).toMatchObject({ startTime: "09:00", therapist: { name: "Ana Ferreby" } });
  });

  it("keeps to the wishes, and offers near misses as such", async () => {
    const found = await ask({
      weekdays: ["2", "3"],
      untilTime: "11:00",
      earliestOn: "2026-12-02",
      therapistIds: practice.staff.therapist.id,
    });
    const fitting = found.times.filter((t) => t.meetsEveryWish);
    expect(fitting.length).toBeGreaterThan(0);
    expect(fitting.every((t) => t.endTime <= "11:00" && t.therapist.name === "Ana Ferreby")).toBe(true);
    expect(fitting.every((t) => [2, 3].includes(weekdayOf(t.day)) && t.day >= "2026-12-02")).toBe(true);
    expect(found.times.filter((t) => !t.meetsEveryWish).every((t) => t.drawbacks.length > 0)).toBe(true);
  });

  it("says why there is none and which wish to give up", async () => {
    const none = (await ask({ weekdays: "7" })).none;
    expect(none).toMatchObject({ kind: "wishes", relax: { wish: "days" } });
    expect(none?.relax?.message).toMatch(
      /^Any day of the week would give \d+ times, the first on Tuesday 1 December 2026 at \d/,
    );
    const late = await ask({ latestOn: "2026-12-05", earliestOn: "2026-12-05" });
    expect(late.none).toMatchObject({ kind: "wishes", relax: { wish: "latest" } });
  });

  it("leaves out leave, blocked rooms and other sites out of reach", async () => {
    const own = await buildPractice();
    const common = {
      practiceId: own.practiceId,
      kind: "leave" as const,
      reason: "Annual leave",
      createdBy: own.staff.owner.id,
    };
    const away = [own.staff.therapist.id, own.staff.owningTherapist.id];
    const [startsAt, endsAt] = [new Date("2026-12-01T00:00Z"), new Date("2026-12-08T00:00Z")];
    await own.db
      .insert(absences)
      .values(away.map((staffMemberId) => ({ ...common, id: newId(), staffMemberId, startsAt, endsAt })));
    const input = { serviceId: own.services.followUp.id };
    const desk = await findTimes(contextFor(own, "receptionist"), input);
    expect(desk.times[0]?.day).toBe("2026-12-08");
    expect(desk.times.every((t) => t.site.name === "Saltgate")).toBe(true);
    const owner = await findTimes(contextFor(own, "owner"), input);
    expect(owner.times[0]).toMatchObject({ day: "2026-12-01", site: { name: "Tollhouse Lane" } });
  });

  it("never offers what cannot be booked", async () => {
    const own = await buildPractice();
    const patient = await addPatient(own);
    const owner = contextFor(own, "owner");
    for (let n = 0; n < 12; n += 1) {
      const { times } = await findTimes(owner, {
        serviceId: own.services.initial.id,
        patientId: patient.id,
        limit: 3,
        order: ["day"],
      });
      const time = times[n % times.length];
      if (!time) throw new Error("No time was found.");
      const ids = { therapistId: time.therapist.id, siteId: time.site.id, roomId: time.room.id };
      const view = await bookAppointment(owner, {
        patientId: patient.id,
        serviceId: own.services.initial.id,
        startsAt: time.startsAt,
        ...ids,
      });
      expect(view.state).toBe("booked");
    }
  });
});

describe("what is refused", () => {
  it.each<[string, object, string]>([
    ["a date that has passed", { latestOn: "2026-11-30" }, "in-the-past"],
    ["dates the wrong way round", { earliestOn: "2026-12-10", latestOn: "2026-12-09" }, "dates-reversed"],
    ["more than a year", { latestOn: "2028-01-01" }, "too-far"],
  ])("%s", async (_name, more, kind) => expect((await failureOf(ask(more))).kind).toBe(kind));

  it("rows of another practice, sites out of reach and roles without the right", async () => {
    expect((await failureOf(ask({ serviceId: other.services.followUp.id }))).code).toBe("not-found");
    expect((await failureOf(ask({ patientId: (await addPatient(other)).id }))).code).toBe("not-found");
    expect((await failureOf(ask({ siteIds: practice.sites.tollhouse.id }, "receptionist"))).code).toBe(
      "not-found",
    );
    const accounts = findTimes(contextFor(practice, "accounts"), {
      serviceId: practice.services.followUp.id,
    });
    expect((await failureOf(accounts)).code).toBe("forbidden");
    expect((await failureOf(ask({ weekdays: "8" }))).code).toBe("invalid");
  });

  it("finds a time past lunch for a visit whose clean-down runs into it", async () => {
    const view = await bookAppointment(
      contextFor(practice, "owner"),
      followUp(practice, patientId, "2026-12-02T11:30"),
    );
    expect(view.endTime).toBe("12:00");
  });
});
