import { getDiarySettingsInput } from "@withy/contracts/diary";
import { verb } from "../verb";
import { readDiarySettings } from "./diary-settings";

/** What the owner has set about reminders and calendar feeds. */
export const getDiarySettings = verb("practice.manage", getDiarySettingsInput, (ctx) =>
  readDiarySettings(ctx),
);
