import { newId } from "@withy/core/ids";
import { calendarFeeds, classSessions, diarySettings, staffMembers } from "@withy/db/schema";
import {
  cancelAppointment,
  getMyCalendarFeed,
  makeCalendarFeed,
  readCalendarFeed,
  revokeCalendarFeed,
} from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import ICAL from "ical.js";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});

const therapist = () => contextFor(practice, "therapist");
const tokenOf = (path: string) => path.replace("/api/feeds/", "").replace(".ics", "");

async function newFeed(): Promise<string> {
  return tokenOf((await makeCalendarFeed(therapist(), {})).path);
}

const read = (token: string, known: string | null = null) =>
  readCalendarFeed(systemContextFor(practice), { token, caller: `test-${practice.practiceId}`, known });

async function eventsOf(token: string) {
  const { content } = await read(token);
  const root = new ICAL.Component(ICAL.parse(content ?? "") as unknown[]);
  return root.getAllSubcomponents("vevent").map((vevent) => ({
    event: new ICAL.Event(vevent),
    status: vevent.getFirstPropertyValue("status"),
  }));
}

const visitOn = async (day: string, time: string, values = {}) =>
  addAppointment(practice, {
    patientId: (await addPatient(practice, { givenName: "Perran", familyName: "Oake" })).id,
    day,
    time,
    values,
  });

describe("a calendar feed", () => {
  it("holds the therapist's own visits and classes by initials, site and room, and nothing else", async () => {
    await visitOn("2026-12-08", "10:00");
    await visitOn("2026-12-08", "11:00", {
      therapistId: practice.staff.otherTherapist.id,
      roomId: practice.rooms.saltgateRoom2.id,
      deskNote: "Somebody else's",
    });
    const now = practice.clock.now();
    await practice.db.insert(classSessions).values({
      practiceId: practice.practiceId,
      id: newId(),
      siteId: practice.sites.saltgate.id,
      therapistId: practice.staff.therapist.id,
      roomId: practice.rooms.saltgateGym.id,
      serviceId: practice.services.followUp.id,
      title: "Painful knees",
      startsAt: new Date("2026-12-09T10:00:00Z"),
      endsAt: new Date("2026-12-09T11:00:00Z"),
      capacity: 8,
      createdAt: now,
      createdBy: practice.staff.receptionist.id,
      updatedAt: now,
    });
    const token = await newFeed();
    const events = await eventsOf(token);
    expect(events.map(({ event }) => [event.summary, event.startDate.toString()])).toEqual([
      ["P. O.", "2026-12-08T10:00:00Z"],
      ["Class", "2026-12-09T10:00:00Z"],
    ]);
    const { content } = await read(token);
    for (const word of ["Oake", "Follow-up", "knees", "post.example", "Somebody"])
      expect(content).not.toContain(word);
  });

  it("carries names where the practice allows it", async () => {
    await visitOn("2026-12-08", "10:00");
    await practice.db.insert(diarySettings).values({ practiceId: practice.practiceId, hasNamesInFeed: true });
    expect((await eventsOf(await newFeed()))[0]?.event.summary).toBe("Perran Oake");
  });

  it("reaches 30 days back and 180 ahead, to the day", async () => {
    for (const day of ["2026-10-31", "2026-11-01", "2027-05-30", "2027-05-31"]) await visitOn(day, "10:00");
    const days = (await eventsOf(await newFeed())).map(({ event }) =>
      event.startDate.toString().slice(0, 10),
    );
    expect(days).toEqual(["2026-11-01", "2027-05-30"]);
  });

  it("keeps a visit's identity through a cancellation and says it is cancelled", async () => {
    const visit = await visitOn("2026-12-08", "10:00");
    const token = await newFeed();
    const [before] = await eventsOf(token);
    await cancelAppointment(contextFor(practice, "receptionist"), {
      appointmentId: visit.id,
      version: 1,
      by: "patient",
      reason: "Away",
    });
    const [after] = await eventsOf(token);
    expect([before?.status, after?.status]).toEqual(["CONFIRMED", "CANCELLED"]);
    expect(after?.event.uid).toBe(before?.event.uid);
    expect([before?.event.sequence, after?.event.sequence]).toEqual([1, 2]);
  });

  it("answers not modified to whoever holds this version, until something changes", async () => {
    await visitOn("2026-12-08", "10:00");
    const token = await newFeed();
    const { etag } = await read(token);
    for (const known of [etag, `W/${etag}`, `"other", ${etag}`, "*"])
      expect(await read(token, known)).toEqual({ etag, content: null });
    expect((await read(token, '"other"')).content).not.toBeNull();
    await visitOn("2026-12-08", "13:00");
    const changed = await read(token, etag);
    expect(changed.etag).not.toBe(etag);
    expect(changed.content).not.toBeNull();
  });
});

describe("the address of a feed", () => {
  const feedRows = () =>
    practice.db.select().from(calendarFeeds).where(eq(calendarFeeds.practiceId, practice.practiceId));

  it("is given once and kept as a hash alone, and its making and ending are written down", async () => {
    const { path, feed } = await makeCalendarFeed(therapist(), {});
    expect(path).toMatch(/^\/api\/feeds\/[A-Za-z0-9_-]{43}\.ics$/);
    expect(await getMyCalendarFeed(therapist(), {})).toEqual({ canHaveFeed: true, feed });
    const [row] = await feedRows();
    expect(JSON.stringify(row)).not.toContain(tokenOf(path));
    await revokeCalendarFeed(therapist(), {});
    expect((await auditOf(practice, row?.id ?? "")).map((event) => event.action)).toEqual([
      "calendar-feed.made",
      "calendar-feed.revoked",
    ]);
  });

  it("stops when it is ended, when a newer one is made, and when its owner leaves, in the same words", async () => {
    const words = async (token: string) =>
      read(token).then(
        () => "an answer",
        (error: Error & { code?: string }) => `${error.code}: ${error.message}`,
      );
    const wrong = await words("A".repeat(43));
    expect(wrong).toMatch(/^not-found: /);
    expect(await words("short")).toBe(wrong);
    const first = await newFeed();
    const second = await newFeed();
    expect(await words(first)).toBe(wrong);
    expect(await words(second)).toBe("an answer");
    await revokeCalendarFeed(therapist(), {});
    expect(await words(second)).toBe(wrong);
    const third = await newFeed();
    await practice.db
      .update(staffMembers)
      .set({ isActive: false })
      .where(
        and(
          eq(staffMembers.practiceId, practice.practiceId),
          eq(staffMembers.id, practice.staff.therapist.id),
        ),
      );
    expect(await words(third)).toBe(wrong);
  });

  it("made in two browsers at once leaves one that works", async () => {
    const made = await Promise.all([1, 2, 3].map(newFeed));
    const alive = await Promise.all(
      made.map((token) =>
        read(token)
          .then(() => 1)
          .catch(() => 0),
      ),
    );
    expect(alive.reduce<number>((sum, n) => sum + n, 0)).toBe(1);
    expect((await feedRows()).filter((row) => row.revokedAt === null)).toHaveLength(1);
  });

  it("is one's own: no other practice's diary and no colleague's is in it", async () => {
    const token = await newFeed();
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    await addAppointment(other, {
      patientId: (await addPatient(other)).id,
      day: "2026-12-08",
      time: "10:00",
    });
    // Even a row with the same therapist's id belongs to its practice alone.
    expect(await eventsOf(token)).toEqual([]);
  });

  it("is for therapists only", async () => {
    await expect(makeCalendarFeed(contextFor(practice, "receptionist"), {})).rejects.toMatchObject({
      code: "refused",
      kind: "no-therapist",
    });
    await expect(revokeCalendarFeed(contextFor(practice, "receptionist"), {})).rejects.toMatchObject({
      code: "not-found",
    });
  });

  it("is written into the audit once a day, however often it is read", async () => {
    const token = await newFeed();
    await Promise.all([read(token), read(token), read(token)]);
    practice.clock.set("2026-12-01T23:59:00Z");
    await read(token);
    practice.clock.set("2026-12-02T00:00:00Z");
    await read(token);
    const [row] = await feedRows();
    const events = await auditOf(practice, row?.id ?? "");
    expect(events.filter((event) => event.action === "calendar-feed.read")).toHaveLength(2);
    expect((await getMyCalendarFeed(therapist(), {})).feed?.lastReadOn).toBe("2026-12-02");
  });

  it("answers at most sixty times in a quarter of an hour, and then again", async () => {
    const token = await newFeed();
    for (let n = 0; n < 60; n += 1) await read(token);
    await expect(read(token)).rejects.toMatchObject({ kind: "too-many-tries" });
    practice.clock.advance(16);
    expect((await read(token)).content).not.toBeNull();
  });
});
