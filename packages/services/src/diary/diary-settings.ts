import type { DiarySettingsView } from "@withy/contracts/diary";
import { diarySettings } from "@withy/db/schema";
import { usualReminderHours } from "@withy/diary/due-reminder";
import { eq } from "drizzle-orm";
import type { Context } from "../context";

/** What the practice has set about its diary; version 0 and the usual where it has set nothing. */
export async function readDiarySettings(
  ctx: Pick<Context, "db" | "practiceId">,
  options: { lock?: boolean } = {},
): Promise<DiarySettingsView> {
  const query = ctx.db
    .select()
    .from(diarySettings)
    .where(eq(diarySettings.practiceId, ctx.practiceId))
    .limit(1);
  const [row] = await (options.lock ? query.for("update") : query);
  return {
    reminderHours: row?.reminderHours ?? usualReminderHours,
    hasNamesInFeed: row?.hasNamesInFeed ?? false,
    version: row?.version ?? 0,
  };
}
