import { describe, expect, it } from "vitest";
import type { AppointmentState } from "./appointment-states";
import { checkMark, isLateCancellation } from "./check-mark";

const startsAt = new Date("2026-12-01T10:45:00Z");
const zone = "Europe/London";

describe("marking a visit", () => {
  it.each<[AppointmentState, AppointmentState, string, string | null]>([
    ["booked", "arrived", "2026-12-01T10:38:00Z", null],
    ["booked", "arrived", "2026-11-30T23:59:00Z", "too-early"],
    ["booked", "arrived", "2026-12-01T00:00:00Z", null],
    ["booked", "confirmed", "2026-11-20T09:00:00Z", null],
    ["booked", "noshow", "2026-12-01T10:44:59Z", "too-early"],
    ["confirmed", "noshow", "2026-12-01T10:45:00Z", null],
    ["arrived", "in-session", "2026-12-01T10:45:00Z", null],
    ["in-session", "fulfilled", "2026-12-01T11:15:00Z", null],
    ["fulfilled", "arrived", "2026-12-01T11:15:00Z", "wrong-state"],
    ["cancelled", "arrived", "2026-12-01T11:15:00Z", "wrong-state"],
    ["noshow", "arrived", "2026-12-01T10:55:00Z", null],
  ])("%s to %s at %s: %s", (from, to, now, kind) => {
    expect(checkMark({ from, to, startsAt, now: new Date(now), zone })?.kind ?? null).toBe(kind);
  });
});

describe("a late cancellation", () => {
  it.each([
    ["patient", "2026-11-30T10:45:00Z", false],
    ["patient", "2026-11-30T10:45:01Z", true],
    ["patient", "2026-12-01T12:00:00Z", true],
    ["clinic", "2026-12-01T10:40:00Z", false],
  ] as const)("by the %s at %s: %s", (by, now, expected) => {
    expect(isLateCancellation({ by, startsAt, now: new Date(now), noticeHours: 24 })).toBe(expected);
  });
});
