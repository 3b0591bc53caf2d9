import { diarySettings } from "@withy/db/schema";
import { eq } from "drizzle-orm";
import type { Context } from "../context";

const usual = { offerCount: 3, offerMinutes: 120 };

/** How many people a freed time is offered to at once, and for how long. */
export async function readOfferSettings(ctx: Context): Promise<{ offerCount: number; offerMinutes: number }> {
  const { offerCount, offerMinutes } = diarySettings;
  const [row] = await ctx.db
    .select({ offerCount, offerMinutes })
    .from(diarySettings)
    .where(eq(diarySettings.practiceId, ctx.practiceId));
  return row ?? usual;
}
