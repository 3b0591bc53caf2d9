import { type DiaryPulseView, getDiaryPulseInput } from "@withy/contracts/diary";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { verb } from "../verb";
import { rowsOf } from "./raw-rows";
import { readableSites } from "./site-reach";

/** The latest change at any of the sites. Each site's end of the index is read on its own: one row each. */
export async function readPulse(ctx: Context, siteIds: readonly string[]): Promise<string | null> {
  if (siteIds.length === 0) return null;
  const ends = siteIds.map(
    (
      id,
    ) => sql`(select c.id from appointment_changes c where c.practice_id = ${ctx.practiceId} and c.site_id = ${id}
      order by c.changed_at desc, c.id desc limit 1)`,
  );
  const rows = await rowsOf<{ id: string }>(ctx.db, sql.join(ends, sql` union all `));
  // Ids are made in order of time, so the greatest is the latest.
  return rows.reduce<string | null>((last, { id }) => (last === null || id > last ? id : last), null);
}

/** Whether anything in the diary changed, for screens that ask every two seconds. */
export const getDiaryPulse = verb(
  "diary.read",
  getDiaryPulseInput,
  async (ctx, input): Promise<DiaryPulseView> => ({
    pulse: await readPulse(ctx, await readableSites(ctx, input.siteIds)),
  }),
);
