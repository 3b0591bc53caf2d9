import { formatPhone } from "@withy/core/identifiers/phone";
import { practices, sites } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";

/** Practice and site as they stand at the head of a letter. */
export async function loadLetterSender(ctx: Pick<Context, "db" | "practiceId">, siteId: string) {
  const [row] = await ctx.db
    .select({ practice: practices, site: sites })
    .from(sites)
    .innerJoin(practices, eq(practices.id, sites.practiceId))
    .where(and(eq(sites.practiceId, ctx.practiceId), eq(sites.id, siteId)))
    .limit(1);
  if (!row) throw new Error("A letter names a site that does not exist");
  const { practice, site } = row;
  return {
    practice: practice.name,
    siteLine: [site.name, ...site.addressLines, site.postcode].filter(isNotRepeated).join(", "),
    contactLine: `${formatPhone(site.phone)}, ${practice.email}`,
    zone: site.zone,
  };
}

/** "Saltgate, 2 Saltgate" says the name once only where name and line are the same. */
function isNotRepeated(line: string, index: number, lines: string[]): boolean {
  return lines.indexOf(line) === index;
}
