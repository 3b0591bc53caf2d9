import { describe, expect, it } from "vitest";
import { readReminderHours, reminderHoursWords } from "./reminder-hours";

describe("hours as they are typed", () => {
  it.each<[string, number[]]>([
    ["48, 24", [48, 24]],
    ["48 and 24", [48, 24]],
    ["  2 ", [2]],
    ["", []],
    ["two", [-1]],
    ["24.5", [-1]],
    ["-24", [-1]],
  ])("%j", (text, hours) => expect(readReminderHours(text)).toEqual(hours));

  it("read back as they are shown", () => {
    expect(readReminderHours(reminderHoursWords([72, 48, 2]))).toEqual([72, 48, 2]);
  });
});
