import { listSitesInput, type SiteView } from "@withy/contracts/practices";
import { sites } from "@withy/db/schema";
import { asc, eq } from "drizzle-orm";
import { verb } from "../verb";

/** Every site of the practice, in the practice's own order. A group has a few dozen at most. */
export const listSites = verb("practice.read", listSitesInput, async (ctx): Promise<SiteView[]> => {
  const rows = await ctx.db
    .select()
    .from(sites)
    .where(eq(sites.practiceId, ctx.practiceId))
    .orderBy(asc(sites.position));
  return rows.map(({ id, name, zone, nation, isStepFree }) => ({ id, name, zone, nation, isStepFree }));
});
