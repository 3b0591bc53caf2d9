import fc from "fast-check";
import { Temporal } from "temporal-polyfill";
import { expect, it } from "vitest";
import { dayOf, timeOf } from "./wall-clock";

const zones = ["Europe/London", "Europe/Dublin", "America/New_York", "Asia/Kathmandu", "Pacific/Apia", "UTC"];

// The reference is the polyfill of TC39's Temporal proposal.
it("day and time at a site are those of Temporal, whatever the clocks do", () => {
  const from = Date.UTC(2000, 0, 1);
  const minute = fc.integer({ min: 0, max: 60 * 24 * 365 * 60 });
  fc.assert(
    fc.property(minute, fc.constantFrom(...zones), (n, zone) => {
      const at = new Date(from + n * 60_000);
      const there = Temporal.Instant.fromEpochMilliseconds(at.getTime()).toZonedDateTimeISO(zone);
      expect(dayOf(at, zone)).toBe(there.toPlainDate().toString());
      expect(timeOf(at, zone)).toBe(there.toPlainTime().toString({ smallestUnit: "minute" }));
    }),
    { numRuns: 2000 },
  );
});
