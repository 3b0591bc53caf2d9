import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { dueReminder, usualReminderHours } from "./due-reminder";

const at = (text: string) => Date.parse(`2026-12-${text}:00Z`);
const hour = 3_600_000;

describe("the reminder that is due", () => {
  it.each<[string, { placed: string; now: string; hours?: number[] }, number | null]>([
    ["two days before, not a minute sooner", { placed: "01T09:00", now: "06T09:59" }, null],
    ["two days before, to the minute", { placed: "01T09:00", now: "06T10:00" }, 48],
    ["between the two it is still the first", { placed: "01T09:00", now: "07T09:59" }, 48],
    ["the day before it is the second", { placed: "01T09:00", now: "07T10:00" }, 24],
    ["after a standstill only the second goes", { placed: "01T09:00", now: "07T20:00" }, 24],
    ["booked inside the first window: the second alone", { placed: "06T12:00", now: "06T12:01" }, null],
    ["and that in its time", { placed: "06T12:00", now: "07T10:00" }, 24],
    ["booked inside the last window: none", { placed: "07T10:00", now: "07T15:00" }, null],
    ["the visit begins: too late", { placed: "01T09:00", now: "08T10:00" }, null],
    ["a practice that sends none", { placed: "01T09:00", now: "08T09:00", hours: [] }, null],
    ["hours in any order", { placed: "01T09:00", now: "08T08:30", hours: [2, 72, 24] }, 2],
  ])("%s", (_, { placed, now, hours = [...usualReminderHours] }, answer) => {
    const visit = { startsAt: at("08T10:00"), placedAt: at(placed) };
    expect(dueReminder(visit, hours, at(now))).toBe(answer);
  });

  it("counts elapsed hours over a change of the clocks", () => {
    // 10:00 in London on the day the clocks have gone back is 10:00 UTC; a day of 25 hours lies before it.
    const visit = { startsAt: Date.parse("2026-10-25T10:00:00Z"), placedAt: 0 };
    expect(dueReminder(visit, [24], Date.parse("2026-10-24T09:59:00Z"))).toBeNull();
    expect(dueReminder(visit, [24], Date.parse("2026-10-24T10:00:00Z"))).toBe(24);
  });

  it("watched minute by minute, each falls due at most once and never out of turn", () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 1, max: 100 }), { maxLength: 4 }),
        fc.integer({ min: 0, max: 120 * 60 }),
        (hours, placedMinutesBefore) => {
          const startsAt = 200 * hour;
          const placedAt = startsAt - placedMinutesBefore * 60_000;
          const seen: number[] = [];
          for (let now = placedAt; now < startsAt + hour; now += 60_000) {
            const due = dueReminder({ startsAt, placedAt }, hours, now);
            if (due !== null && seen.at(-1) !== due) seen.push(due);
          }
          const expected = hours.filter((h) => h * 60 < placedMinutesBefore).sort((a, b) => b - a);
          expect(seen).toEqual(expected);
        },
      ),
      { numRuns: 60 },
    );
  });
});
