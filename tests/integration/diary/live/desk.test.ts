import { diaryHolds } from "@withy/db/schema";
import {
  bookAppointment,
  endPresence,
  holdTime,
  listHolds,
  listPresence,
  listPutAside,
  listSavedViews,
  putAside,
  releaseHold,
  removePutAside,
  removeSavedView,
  saveView,
  showPresence,
} from "@withy/services/diary";
import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { auditOf } from "../../../support/audit-rows";
import { contextFor } from "../../../support/contexts";
import { addPatient } from "../../../support/people";
import { buildPractice, type TestPractice } from "../../../support/practice";
import { bookedVisit, failureOf, followUp } from "../booking-steps";
import { type LiveProcess, openBrowser, openProcess, openSession } from "./live-steps";

let practice: TestPractice;
let other: TestPractice;
let app: LiveProcess;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice();
  app = openProcess();
});

afterAll(() => app.connection.close());

const place = (own: TestPractice, startsAt: string, more: object = {}) => ({
  siteId: own.sites.saltgate.id,
  therapistId: own.staff.therapist.id,
  startsAt,
  ...more,
});

describe("a time that is being booked", () => {
  it("is shown to others with a name for five minutes, one for each person, and keeps nobody from booking", async () => {
    const desk = contextFor(practice, "receptionist");
    const owner = contextFor(practice, "owner");
    practice.clock.set("2026-12-01T09:00:00Z");
    await holdTime(desk, place(practice, "2026-12-03T09:00"));
    await holdTime(desk, place(practice, "2026-12-03T10:15", { durationMinutes: 45 }));
    expect(await listHolds(desk, {})).toEqual([]);
    expect(await listHolds(owner, {})).toEqual([
      {
        byName: desk.staffName,
        siteId: practice.sites.saltgate.id,
        therapistId: practice.staff.therapist.id,
        day: "2026-12-03",
        fromMinute: 615,
        untilMinute: 660,
      },
    ]);
    expect(await listHolds(owner, { siteIds: practice.sites.tollhouse.id })).toEqual([]);
    practice.clock.advance(4);
    await holdTime(desk, place(practice, "2026-12-03T10:15", { durationMinutes: 45 }));
    practice.clock.advance(4);
    expect(await listHolds(owner, {})).toHaveLength(1);
    const patient = await addPatient(practice);
    const visit = await bookAppointment(owner, followUp(practice, patient.id, "2026-12-03T10:15"));
    expect(visit.state).toBe("booked");
    practice.clock.advance(1);
    expect(await listHolds(owner, {})).toEqual([]);
    practice.clock.set("2026-12-01T09:00:00Z");
  });

  it("is given back at once, and only one's own", async () => {
    const desk = contextFor(practice, "receptionist");
    const owner = contextFor(practice, "owner");
    await holdTime(desk, place(practice, "2026-12-03T13:00"));
    await releaseHold(owner, {});
    expect(await listHolds(owner, {})).toHaveLength(1);
    await releaseHold(desk, {});
    expect(await listHolds(owner, {})).toEqual([]);
  });

  it("must lie within reach, with someone who treats, at a time that is", async () => {
    const desk = contextFor(practice, "receptionist");
    const tollhouse = { siteId: practice.sites.tollhouse.id };
    const wrong: [object, string][] = [
      [tollhouse, "not-found"],
      [{ siteId: other.sites.saltgate.id }, "not-found"],
      [{ therapistId: other.staff.therapist.id }, "not-found"],
      [{ therapistId: practice.staff.accounts.id }, "not-found"],
      [{ startsAt: "2027-03-28T01:30" }, "refused"],
      [{ startsAt: "some time" }, "invalid"],
      [{ durationMinutes: 481 }, "invalid"],
    ];
    for (const [part, code] of wrong) {
      const failure = await failureOf(holdTime(desk, { ...place(practice, "2026-12-03T13:00"), ...part }));
      expect(failure.code, JSON.stringify(part)).toBe(code);
    }
    const accounts = contextFor(practice, "accounts");
    expect((await failureOf(holdTime(accounts, place(practice, "2026-12-03T13:00")))).code).toBe("forbidden");
    expect((await failureOf(listHolds(desk, { siteIds: tollhouse.siteId }))).code).toBe("not-found");
  });

  it("leaves one row of two desks' presses at once, and is told to the streams of its site", async () => {
    const own = await buildPractice();
    const here = openBrowser(own, await openSession(own, "owner"), [own.sites.saltgate.id]);
    const there = openBrowser(own, await openSession(own, "owner"), [own.sites.tollhouse.id]);
    here.join(app);
    there.join(app);
    await vi.waitFor(() => expect(there.cursor()).not.toBeNull());
    const desk = contextFor(own, "receptionist", { clock: { now: () => new Date() } });
    await Promise.all(
      ["09:00", "09:30", "10:00", "10:30"].map((time) => holdTime(desk, place(own, `2026-12-03T${time}`))),
    );
    const rows = await own.db.select().from(diaryHolds).where(eq(diaryHolds.practiceId, own.practiceId));
    expect(rows).toHaveLength(1);
    await vi.waitFor(() => expect(here.heldAt).toContain(own.sites.saltgate.id));
    const told = here.heldAt.length;
    await releaseHold(desk, {});
    await vi.waitFor(() => expect(here.heldAt.length).toBeGreaterThan(told));
    expect(there.heldAt).toEqual([]);
    here.leave();
    there.leave();
    expect(app.faults).toEqual([]);
  });
});

describe("who has an appointment open", () => {
  it("is shown to others until it is closed or not heard of for a minute", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-04T09:00");
    const appointmentId = visit.id;
    const desk = contextFor(practice, "receptionist");
    const owner = contextFor(practice, "owner");
    await showPresence(desk, { appointmentId, isEditing: false });
    expect(await listPresence(desk, { appointmentId })).toEqual([]);
    expect(await listPresence(owner, { appointmentId })).toEqual([
      { name: desk.staffName, isEditing: false },
    ]);
    await showPresence(desk, { appointmentId, isEditing: true });
    expect(await listPresence(owner, { appointmentId })).toEqual([{ name: desk.staffName, isEditing: true }]);
    await endPresence(desk, { appointmentId });
    expect(await listPresence(owner, { appointmentId })).toEqual([]);
    await showPresence(desk, { appointmentId, isEditing: true });
    practice.clock.advance(1);
    expect(await listPresence(owner, { appointmentId })).toEqual([]);
    practice.clock.set("2026-12-01T09:00:00Z");
  });

  it("is neither shown nor told beyond reach", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-04T10:00");
    const appointmentId = visit.id;
    const strangers = [contextFor(practice, "tollhouseReceptionist"), contextFor(other, "owner")];
    for (const ctx of strangers) {
      expect((await failureOf(showPresence(ctx, { appointmentId, isEditing: false }))).code).toBe(
        "not-found",
      );
      expect((await failureOf(endPresence(ctx, { appointmentId }))).code).toBe("not-found");
      expect((await failureOf(listPresence(ctx, { appointmentId }))).code).toBe("not-found");
    }
    const accounts = contextFor(practice, "accounts");
    expect((await failureOf(listPresence(accounts, { appointmentId }))).code).toBe("forbidden");
  });
});

describe("what is put aside", () => {
  const typed = { timeText: "10:1", therapistId: "", weekdays: ["2", "4"] };

  it("is kept for its own person in every browser, put back as itself, and taken out", async () => {
    const own = await buildPractice();
    const desk = contextFor(own, "receptionist");
    const patient = await addPatient(own);
    const item = { kind: "booking" as const, title: "Follow-up, Tue 8 Dec", patientId: patient.id, typed };
    const { id } = await putAside(desk, item);
    own.clock.advance(10);
    await putAside(desk, { kind: "finding", title: "Find a time", typed: {} });
    const again = contextFor(own, "receptionist");
    expect(await listPutAside(again, {})).toMatchObject([
      { kind: "finding", title: "Find a time", patient: null, typed: {}, time: "09:10" },
      { id, kind: "booking", title: item.title, typed, patient: { id: patient.id, bornOn: patient.bornOn } },
    ]);
    own.clock.advance(10);
    await putAside(desk, { ...item, itemId: id, typed: { timeText: "10:15" } });
    expect((await listPutAside(again, {})).map((one) => [one.id, one.typed])[0]).toEqual([
      id,
      { timeText: "10:15" },
    ]);
    for (const ctx of [contextFor(own, "owner"), contextFor(own, "tollhouseReceptionist")]) {
      expect(await listPutAside(ctx, {})).toEqual([]);
      expect((await failureOf(putAside(ctx, { ...item, itemId: id }))).code).toBe("not-found");
      expect((await failureOf(removePutAside(ctx, { itemId: id }))).code).toBe("not-found");
    }
    await removePutAside(desk, { itemId: id });
    expect(await listPutAside(again, {})).toHaveLength(1);
    expect((await failureOf(removePutAside(desk, { itemId: id }))).code).toBe("not-found");
    expect((await auditOf(own, id)).map(({ action }) => action)).toEqual([
      "tray.put-aside",
      "tray.put-aside",
      "tray.removed",
    ]);
  });

  it("refuses a foreign patient, a full tray and what no form holds, and changes nothing", async () => {
    const own = await buildPractice();
    const desk = contextFor(own, "receptionist");
    const stranger = await addPatient(other);
    const item = { kind: "booking" as const, title: "A booking", typed: {} };
    expect((await failureOf(putAside(desk, { ...item, patientId: stranger.id }))).code).toBe("not-found");
    const tooMany = Object.fromEntries(Array.from({ length: 21 }, (_, n) => [`field${n}`, ""]));
    for (const wrong of [{ typed: tooMany }, { typed: { note: "x".repeat(401) } }, { title: " " }])
      expect((await failureOf(putAside(desk, { ...item, ...wrong }))).code).toBe("invalid");
    expect(await listPutAside(desk, {})).toEqual([]);
    for (let n = 0; n < 20; n += 1) await putAside(desk, item);
    expect(await failureOf(putAside(desk, item))).toMatchObject({ code: "refused", kind: "tray-full" });
    expect((await failureOf(putAside(contextFor(own, "accounts"), item))).code).toBe("forbidden");
  });
});

describe("views with a name", () => {
  it("are one's own, replaced by the same name, and lead nowhere but to the diary", async () => {
    const desk = contextFor(practice, "receptionist");
    const address = `/diary?site=${practice.sites.saltgate.id}&by=room`;
    await saveView(desk, { name: "Rooms", address: "/diary" });
    await saveView(desk, { name: "Rooms", address });
    const kept = await listSavedViews(desk, {});
    expect(kept).toMatchObject([{ name: "Rooms", address }]);
    const viewId = kept[0]?.id ?? "";
    const owner = contextFor(practice, "owner");
    expect(await listSavedViews(owner, {})).toEqual([]);
    expect((await failureOf(removeSavedView(owner, { viewId }))).code).toBe("not-found");
    for (const wrong of ["//elsewhere.example", "https://elsewhere.example/diary", "/diary/../settings", "/"])
      expect((await failureOf(saveView(desk, { name: "Away", address: wrong }))).code, wrong).toBe("invalid");
    expect((await failureOf(saveView(desk, { name: " ", address }))).code).toBe("invalid");
    await removeSavedView(desk, { viewId });
    expect(await listSavedViews(desk, {})).toEqual([]);
    expect((await failureOf(listSavedViews(contextFor(practice, "accounts"), {}))).code).toBe("forbidden");
  });
});
