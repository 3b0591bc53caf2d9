import { changeDiarySettings, getDiarySettings } from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
const owner = () => contextFor(practice, "owner");

describe("reminders and calendar feeds", () => {
  it("stand at two days and one day, with initials, where nothing is set", async () => {
    expect(await getDiarySettings(owner(), {})).toEqual({
      reminderHours: [48, 24],
      hasNamesInFeed: false,
      version: 0,
    });
  });

  it("are set by the owner, in order and without repeats, and it is written down", async () => {
    const saved = await changeDiarySettings(owner(), {
      reminderHours: [2, 72, 2],
      hasNamesInFeed: true,
      version: 0,
    });
    expect(saved).toEqual({ reminderHours: [72, 2], hasNamesInFeed: true, version: 1 });
    expect(await getDiarySettings(owner(), {})).toEqual(saved);
    const [event] = await auditOf(practice, practice.practiceId);
    expect(event).toMatchObject({
      action: "practice.diary-settings-changed",
      detail: { reminderHours: [72, 2], reminderHoursBefore: [48, 24] },
    });
  });

  it.each([
    ["no whole hour", [24.5], "Enter whole hours from 1 to 336, such as 48, 24."],
    ["too soon", [0], "Enter whole hours from 1 to 336, such as 48, 24."],
    ["too far", [337], "Enter whole hours from 1 to 336, such as 48, 24."],
    ["too many", [1, 2, 3, 4, 5], "Choose at most four reminders."],
  ])("refuse %s", async (_, reminderHours, message) => {
    const before = await getDiarySettings(owner(), {});
    const input = { reminderHours, hasNamesInFeed: false, version: before.version };
    await expect(changeDiarySettings(owner(), input)).rejects.toMatchObject({
      code: "invalid",
      fields: [{ field: "reminderHours", message }],
    });
    expect(await getDiarySettings(owner(), {})).toEqual(before);
  });

  it("show both versions to whoever saves too late, also at the very first setting", async () => {
    const fresh = await buildPractice();
    const input = (hours: number) => ({ reminderHours: [hours], hasNamesInFeed: false, version: 0 });
    const ctx = contextFor(fresh, "owner");
    const results = await Promise.allSettled([12, 36].map((h) => changeDiarySettings(ctx, input(h))));
    expect(results.map((r) => r.status).sort()).toEqual(["fulfilled", "rejected"]);
    await expect(changeDiarySettings(ctx, input(6))).rejects.toMatchObject({
      code: "stale",
      detail: { current: await getDiarySettings(ctx, {}) },
    });
  });
});
