import { expect, it } from "vitest";
import { fixedClock, systemClock } from "./clock";

it("a fixed clock stands still until it is told to move", () => {
  const clock = fixedClock("2026-12-01T09:00:00Z");
  expect(clock.now()).toEqual(new Date("2026-12-01T09:00:00Z"));
  clock.advance(90);
  expect(clock.now()).toEqual(new Date("2026-12-01T10:30:00Z"));
  clock.set(new Date("2027-01-01T00:00:00Z"));
  expect(clock.now()).toEqual(new Date("2027-01-01T00:00:00Z"));
});

it("nobody who was told the time can move the clock by it", () => {
  const start = new Date("2026-12-01T09:00:00Z");
  const clock = fixedClock(start);
  start.setFullYear(1999);
  clock.now().setFullYear(1999);
  expect(clock.now()).toEqual(new Date("2026-12-01T09:00:00Z"));
});

it("the system's clock is the machine's", () => {
  const before = Date.now();
  const now = systemClock.now().getTime();
  expect(now).toBeGreaterThanOrEqual(before);
  expect(now).toBeLessThanOrEqual(Date.now());
});
