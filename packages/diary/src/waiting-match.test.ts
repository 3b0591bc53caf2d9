import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type FreedTime, rankWaiting, type Waiting, type WaitingWishes, whyNoMatch } from "./waiting-match";
import { wishWords } from "./wish-words";

const now = new Date("2026-12-01T09:00:00Z");
const at = (time: string, day = "2026-12-08"): Date => new Date(`${day}T${time}:00Z`);
const dayMs = 86_400_000;

/** Tuesday 8 December 2026, 10:15 with Ana Silva at Saltgate; free for 45 minutes, at work until noon. */
const freed: FreedTime = {
  startsAt: at("10:15"),
  workUntil: at("12:00"),
  freeUntil: at("11:00"),
  zone: "Europe/London",
  site: { id: "saltgate", name: "Saltgate" },
  therapist: { id: "ana", name: "Ana Silva" },
};
const someone: Waiting = {
  entryId: "e1",
  wishes: {},
  urgency: "routine",
  since: new Date(now.getTime() - 12 * dayMs),
  service: { name: "Follow-up", durationMinutes: 40, cleanDownMinutes: 5 },
  isGivenByTherapist: true,
  hasRoom: true,
  insteadOfAt: null,
  busy: [],
  hasOffer: false,
};
const why = (change: Partial<Waiting>, time: Partial<FreedTime> = {}): string | null =>
  whyNoMatch({ ...freed, ...time }, { ...someone, ...change }, now);
const wishing = (wishes: WaitingWishes): string | null => why({ wishes });
const lasting = (durationMinutes: number, cleanDownMinutes = 5): Partial<Waiting> => ({
  service: { name: "First visit", durationMinutes, cleanDownMinutes },
});

describe("whom a freed time suits", () => {
  it.each<[string, string | null, string | null]>([
    ["anyone without wishes", why({}), null],
    [
      "a therapist who does not give it",
      why({ isGivenByTherapist: false }),
      "Ana Silva does not give Follow-up",
    ],
    ["too long", why(lasting(60)), "First visit takes 1 hour, and 45 minutes are free"],
    ["exactly long enough", why(lasting(40)), null],
    [
      "no time to clean down before the next visit",
      why(lasting(45)),
      "First visit takes 45 minutes, and 45 minutes are free",
    ],
    [
      "the clean-down may run past working time",
      why(lasting(45), { workUntil: at("11:00"), freeUntil: at("12:00") }),
      null,
    ],
    [
      "the visit may not",
      why(lasting(50), { workUntil: at("11:00"), freeUntil: at("12:00") }),
      "First visit takes 50 minutes, and 45 minutes are free",
    ],
    ["its site", wishing({ siteIds: ["tollhouse", "saltgate"] }), null],
    ["another site", wishing({ siteIds: ["tollhouse"] }), "Would not come to Saltgate"],
    ["another therapist", wishing({ therapistIds: ["tomasz"] }), "Asks for another therapist"],
    ["its weekday", wishing({ weekdays: [1, 2] }), null],
    ["another weekday", wishing({ weekdays: [1, 3] }), "Cannot come on a Tuesday"],
    ["its part of the day", wishing({ partsOfDay: ["morning"] }), null],
    [
      "another part of the day",
      wishing({ partsOfDay: ["afternoon", "evening"] }),
      "Cannot come in the morning",
    ],
    ["the last day that will do", wishing({ latestOn: "2026-12-08" }), null],
    ["a day too late", wishing({ latestOn: "2026-12-07" }), "Wanted to come by Mon 7 Dec"],
    ["notice enough", wishing({ noticeHours: 169 }), null],
    ["too short a notice", wishing({ noticeHours: 170 }), "Needs 170 hours to get here"],
    ["a later visit to give up", why({ insteadOfAt: at("10:15", "2026-12-20") }), null],
    [
      "a visit that is sooner",
      why({ insteadOfAt: at("10:15", "2026-12-07") }),
      "Comes sooner than this already",
    ],
    [
      "busy then",
      why({ busy: [{ from: at("10:50").getTime(), to: at("11:30").getTime() }] }),
      "Has another visit at that time",
    ],
    ["busy right after", why({ busy: [{ from: at("10:55").getTime(), to: at("11:30").getTime() }] }), null],
    ["another offer", why({ hasOffer: true }), "Has another offer open"],
    ["no room", why({ hasRoom: false }), "No room of the kind is free"],
  ])("%s", (_name, found, expected) => expect(found).toBe(expected));

  it("reads weekday and part of the day by the site's clock, summer time included", () => {
    // Half past midnight on Monday in summer is still Sunday in UTC; 11:30 UTC is half past twelve.
    const night = {
      startsAt: new Date("2026-07-05T23:30:00Z"),
      workUntil: new Date("2026-07-06T02:00:00Z"),
      freeUntil: new Date("2026-07-06T02:00:00Z"),
    };
    expect(
      whyNoMatch(
        { ...freed, ...night },
        { ...someone, wishes: { weekdays: [1] } },
        new Date("2026-07-01T09:00:00Z"),
      ),
    ).toBeNull();
    const noon = {
      startsAt: new Date("2026-07-06T11:30:00Z"),
      workUntil: new Date("2026-07-06T15:00:00Z"),
      freeUntil: new Date("2026-07-06T15:00:00Z"),
    };
    expect(
      whyNoMatch(
        { ...freed, ...noon },
        { ...someone, wishes: { partsOfDay: ["afternoon"] } },
        new Date("2026-07-01T09:00:00Z"),
      ),
    ).toBeNull();
  });
});

describe("in which order", () => {
  const ranked = (...changes: Partial<Waiting>[]): string[] =>
    rankWaiting(
      freed,
      changes.map((c, n) => ({ ...someone, entryId: `e${n + 1}`, ...c })),
      now,
    ).map((m) => m.entryId);
  const since = (days: number): Partial<Waiting> => ({ since: new Date(now.getTime() - days * dayMs) });

  it("puts urgency before a somewhat longer wait, and a far longer wait before urgency", () => {
    expect(ranked(since(20), { urgency: "urgent", ...since(1) })).toEqual(["e2", "e1"]);
    expect(ranked(since(45), { urgency: "soon", ...since(1) })).toEqual(["e1", "e2"]);
  });
  it("prefers among equals who asked for the therapist, fills the time, gains days, waits longer, came first", () => {
    expect(ranked({}, { wishes: { therapistIds: ["ana"] } })).toEqual(["e2", "e1"]);
    expect(ranked(lasting(20), lasting(40))).toEqual(["e2", "e1"]);
    expect(
      ranked({ insteadOfAt: at("10:15", "2026-12-10") }, { insteadOfAt: at("10:15", "2026-12-20") }),
    ).toEqual(["e2", "e1"]);
    expect(ranked(since(12), { since: new Date(now.getTime() - 12 * dayMs - 60_000) })).toEqual(["e2", "e1"]);
    expect(ranked({}, {})).toEqual(["e1", "e2"]);
  });
  it("says why in words", () => {
    const entry: Waiting = {
      ...someone,
      urgency: "urgent",
      wishes: { therapistIds: ["ana"] },
      insteadOfAt: at("10:15", "2026-12-22"),
    };
    expect(rankWaiting(freed, [entry], now)[0]?.reasons).toEqual([
      "Urgent",
      "Waits 12 days",
      "Asks for Ana Silva",
      "Fills the time",
      "Comes 14 days sooner",
    ]);
    expect(rankWaiting(freed, [{ ...someone, ...lasting(20), since: now }], now)[0]?.reasons).toEqual([
      "Waits since today",
      "Leaves 25 minutes over",
    ]);
  });
});

const anyEntry = fc.record<Waiting>({
  entryId: fc.uuid(),
  wishes: fc.record({
    weekdays: fc.uniqueArray(fc.integer({ min: 1, max: 7 })),
    partsOfDay: fc.uniqueArray(fc.constantFrom("morning" as const, "afternoon" as const, "evening" as const)),
    siteIds: fc.uniqueArray(fc.constantFrom("saltgate", "tollhouse")),
    therapistIds: fc.uniqueArray(fc.constantFrom("ana", "tomasz")),
    noticeHours: fc.integer({ min: 0, max: 240 }),
  }),
  urgency: fc.constantFrom("routine" as const, "soon" as const, "urgent" as const),
  since: fc.integer({ min: 0, max: 200 }).map((days) => new Date(now.getTime() - days * dayMs)),
  service: fc
    .integer({ min: 1, max: 18 })
    .map((n) => ({ name: "Visit", durationMinutes: n * 5, cleanDownMinutes: 5 })),
  isGivenByTherapist: fc.boolean(),
  hasRoom: fc.boolean(),
  insteadOfAt: fc.option(
    fc.integer({ min: -10, max: 60 }).map((days) => new Date(freed.startsAt.getTime() + days * dayMs)),
  ),
  busy: fc.constant([]),
  hasOffer: fc.boolean(),
});

describe("any list", () => {
  const list = fc.uniqueArray(anyEntry, { selector: (e) => e.entryId, maxLength: 12 });
  it("ranks exactly those with nothing in the way, each with a reason, whatever the order of the rows", () => {
    fc.assert(
      fc.property(list, (entries) => {
        const found = rankWaiting(freed, entries, now);
        const suited = entries.filter((e) => whyNoMatch(freed, e, now) === null).map((e) => e.entryId);
        expect(found.map((m) => m.entryId).sort()).toEqual(suited.sort());
        expect(found.every((m, n) => n === 0 || m.score <= (found[n - 1]?.score ?? 0))).toBe(true);
        expect(found.every((m) => m.reasons.length >= 2)).toBe(true);
        expect(rankWaiting(freed, [...entries].reverse(), now)).toEqual(found);
      }),
    );
  });
  it("never ranks someone lower for being more urgent or waiting longer", () => {
    fc.assert(
      fc.property(list, anyEntry, fc.integer({ min: 0, max: 90 }), (others, entry, more) => {
        const place = (e: Waiting): number => {
          const rest = others.filter((o) => o.entryId !== e.entryId);
          return rankWaiting(freed, [...rest, e], now).findIndex((m) => m.entryId === e.entryId);
        };
        const longer = { ...entry, since: new Date(entry.since.getTime() - more * dayMs) };
        expect(place(longer)).toBeLessThanOrEqual(place(entry));
        expect(place({ ...entry, urgency: "urgent" })).toBeLessThanOrEqual(place(entry));
      }),
    );
  });
});

describe("wishes in a line", () => {
  const names: Record<string, string> = { s: "Saltgate", t: "Tollhouse Lane", a: "Ana Silva" };
  it.each<[WaitingWishes, string]>([
    [{}, ""],
    [{ weekdays: [2, 1] }, "Mon or Tue"],
    [{ weekdays: [1, 3, 5], partsOfDay: ["morning"] }, "Mon, Wed or Fri, mornings"],
    [{ siteIds: ["s", "t"], therapistIds: ["a"] }, "at Saltgate or Tollhouse Lane, with Ana Silva"],
    [{ latestOn: "2026-12-12", noticeHours: 24 }, "by Sat 12 Dec, with 24 h notice"],
  ])("%j", (wishes, words) => expect(wishWords(wishes, (id) => names[id] ?? "")).toBe(words));
});
