import { changeDiarySettingsInput, type DiarySettingsView } from "@withy/contracts/diary";
import { stale } from "@withy/core/errors";
import { isDuplicate } from "@withy/db/database-error";
import { diarySettings } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { readDiarySettings } from "./diary-settings";

type Wanted = Pick<DiarySettingsView, "reminderHours" | "hasNamesInFeed">;

async function save(ctx: Context, before: DiarySettingsView, wanted: Wanted): Promise<DiarySettingsView> {
  const version = before.version + 1;
  const set = { reminderHours: [...wanted.reminderHours], hasNamesInFeed: wanted.hasNamesInFeed, version };
  if (before.version === 0) {
    await ctx.db.insert(diarySettings).values({ practiceId: ctx.practiceId, ...set });
    return set;
  }
  const [written] = await ctx.db
    .update(diarySettings)
    .set(set)
    .where(and(eq(diarySettings.practiceId, ctx.practiceId), eq(diarySettings.version, before.version)));
  if (written.affectedRows !== 1) throw stale("page");
  return set;
}

/** Sets when reminders go out and what calendar feeds show. It holds from the worker's next round. */
export const changeDiarySettings = verb(
  "practice.manage",
  changeDiarySettingsInput,
  async (ctx, { version, ...wanted }): Promise<DiarySettingsView> => {
    try {
      return await inTransaction(ctx, async (tx) => {
        const before = await readDiarySettings(tx, { lock: true });
        if (before.version !== version) throw stale("page", { current: before });
        const after = await save(tx, before, wanted);
        await recordAudit(tx, {
          action: "practice.diary-settings-changed",
          subjectKind: "practice",
          subjectId: tx.practiceId,
          detail: {
            reminderHours: after.reminderHours,
            reminderHoursBefore: before.reminderHours,
            hasNamesInFeed: after.hasNamesInFeed,
            hasNamesInFeedBefore: before.hasNamesInFeed,
          },
        });
        return after;
      });
    } catch (error) {
      // Two owners set it for the first time at once.
      if (!isDuplicate(error, "PRIMARY")) throw error;
      throw stale("page", { current: await readDiarySettings(ctx) });
    }
  },
);
