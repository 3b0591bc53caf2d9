import type { DayAppointment, DiaryDayView } from "@withy/contracts/diary";
import { expect, test } from "vitest";
import { type Cursor, moveCursor, placeAt, shownAppointments } from "./day-cursor";

function visit(
  id: string,
  fromMinute: number,
  untilMinute: number,
  state: DayAppointment["state"] = "booked",
) {
  return { id, fromMinute, untilMinute, state } as DayAppointment;
}

function column(id: string, appointments: DayAppointment[]) {
  return {
    id,
    name: id,
    siteId: "site",
    hours: [
      { fromMinute: 480, untilMinute: 720 },
      { fromMinute: 780, untilMinute: 1020 },
    ],
    blocks: [{ kind: "break" as const, reason: "Lunch", fromMinute: 720, untilMinute: 780 }],
    free: [{ fromMinute: 600, untilMinute: 720 }],
    freeMinutes: 120,
    appointments,
  };
}

const day = {
  day: "2026-12-01",
  by: "therapist",
  sites: [],
  bounds: { fromMinute: 420, untilMinute: 1080 },
  nowMinute: null,
  columns: [
    column("Nia", [visit("a", 480, 525), visit("b", 525, 555), visit("gone", 600, 630, "cancelled")]),
    column("Callum", [visit("c", 490, 535), visit("gone-2", 540, 570, "cancelled"), visit("d", 540, 570)]),
  ],
  counts: { booked: 4, waiting: 0, gaps: 1 },
  pulse: null,
} satisfies DiaryDayView;

const at = (column: number, minute: number): Cursor => ({ column, minute });

test.each([
  ["down passes a whole visit", at(0, 480), "ArrowDown", false, at(0, 525)],
  ["down moves five minutes where it is free", at(0, 640), "ArrowDown", false, at(0, 645)],
  ["up enters the visit above at its start", at(0, 525), "ArrowUp", false, at(0, 480)],
  ["right keeps the time, and takes the start of a visit there", at(0, 525), "ArrowRight", false, at(1, 490)],
  ["right stops at the last column", at(1, 700), "ArrowRight", false, at(1, 700)],
  ["left stops at the first column", at(0, 700), "ArrowLeft", false, at(0, 700)],
  ["page down moves an hour", at(0, 640), "PageDown", false, at(0, 700)],
  ["home goes to the start of the day", at(1, 640), "Home", false, at(1, 420)],
  ["ctrl home also goes to the first column", at(1, 640), "Home", true, at(0, 420)],
  ["end goes to the last step", at(0, 640), "End", false, at(0, 1075)],
  ["ctrl down goes to the next visit", at(0, 430), "ArrowDown", true, at(0, 480)],
  ["ctrl up goes to the visit before", at(0, 1000), "ArrowUp", true, at(0, 600)],
])("%s", (_, from, key, ctrl, to) => {
  expect(moveCursor(day, from, key, ctrl)).toEqual(to);
});

test("other keys are not the grid's", () => {
  expect(moveCursor(day, at(0, 480), "b", false)).toBeNull();
});

test("a place is a visit, a block, free, past or outside the hours", () => {
  expect(placeAt(day, at(0, 500))).toMatchObject({ kind: "appointment", appointment: { id: "a" } });
  expect(placeAt(day, at(0, 730))).toEqual({ kind: "block", reason: "Lunch", until: 780 });
  expect(placeAt(day, at(0, 640))).toEqual({ kind: "free", until: 720 });
  expect(placeAt(day, at(0, 560))).toEqual({ kind: "past", until: 600 });
  expect(placeAt(day, at(0, 430))).toEqual({ kind: "off", until: 480 });
});

test("a cancelled visit keeps two steps, and hides where its time was given away", () => {
  expect(placeAt(day, at(0, 605))).toMatchObject({ kind: "appointment", appointment: { id: "gone" } });
  expect(placeAt(day, at(0, 610))).toEqual({ kind: "free", until: 720 });
  expect(day.columns.map((c) => shownAppointments(c).map((a) => a.id))).toEqual([
    ["a", "b", "gone"],
    ["c", "d"],
  ]);
});
