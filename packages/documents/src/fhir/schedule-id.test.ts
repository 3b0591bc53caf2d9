import fc from "fast-check";
import { expect, it } from "vitest";
import { readScheduleId, readSlotId, scheduleId, slotId } from "./schedule-id";

const ids = fc.record({ therapistId: fc.uuid(), siteId: fc.uuid() });

it("is a FHIR id that reads back, for any two rows and any time", () => {
  fc.assert(
    fc.property(
      ids,
      fc.integer({ min: 0, max: 10_000_000 }),
      fc.integer({ min: 1, max: 288 }),
      (key, start, steps) => {
        const from = start * 300_000;
        const slot = slotId({ ...key, from, to: from + steps * 300_000, status: "free" });
        expect(slot).toMatch(/^[A-Za-z0-9.-]{1,64}$/);
        expect(scheduleId(key)).toMatch(/^[A-Za-z0-9.-]{1,64}$/);
        expect(readScheduleId(scheduleId(key))).toEqual(key);
        expect(readSlotId(slot)).toEqual({ ...key, from });
      },
    ),
  );
});

it.each(["", "nonsense", "a".repeat(44), "../../etc/passwd", `${"A".repeat(43)}_`])("%j is none", (text) => {
  expect(readSlotId(text)).toBeNull();
});
