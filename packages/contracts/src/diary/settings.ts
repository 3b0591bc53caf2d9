import { reminderBounds } from "@withy/diary/due-reminder";
import { z } from "zod";

const { leastHours, mostHours, mostReminders } = reminderBounds;

const isReminderHour = (hours: number) =>
  Number.isInteger(hours) && hours >= leastHours && hours <= mostHours;

export const getDiarySettingsInput = z.strictObject({});

export const changeDiarySettingsInput = z.strictObject({
  /** Hours before a visit, in any order; empty for no reminders. */
  reminderHours: z
    .array(z.number("Enter whole hours, such as 48, 24."))
    .max(mostReminders, "Choose at most four reminders.")
    .refine(
      (all) => all.every(isReminderHour),
      `Enter whole hours from ${leastHours} to ${mostHours}, such as 48, 24.`,
    )
    .transform((all) => [...new Set(all)].sort((a, b) => b - a)),
  /** Whether calendar feeds show patients' names; else initials. */
  hasNamesInFeed: z.boolean(),
  /** The version that the screen saw; 0 where nothing was set yet. */
  version: z.int().min(0),
});
export type ChangeDiarySettingsInput = z.input<typeof changeDiarySettingsInput>;

/** What the owner sets about reminders and calendar feeds. */
export interface DiarySettingsView {
  readonly reminderHours: readonly number[];
  readonly hasNamesInFeed: boolean;
  readonly version: number;
}

const weightField = z
  .int("Enter a whole number from 0 to 100.")
  .min(0, "Enter 0 or more.")
  .max(100, "Enter 100 or less.");
const weightsField = z
  .strictObject({ wish: weightField, wait: weightField, knows: weightField, day: weightField })
  .refine((w) => w.wish + w.wait + w.knows + w.day > 0, "Give at least one of the four some weight.");

export const getFindingWeightsInput = z.strictObject({});

export const changeFindingWeightsInput = z.strictObject({
  weights: weightsField,
  /** The weights that the screen saw. */
  before: weightsField,
});
export type ChangeFindingWeightsInput = z.input<typeof changeFindingWeightsInput>;
