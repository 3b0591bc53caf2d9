import { type GpPracticeView, listGpPracticesInput } from "@withy/contracts/patients";
import { formatPhone } from "@withy/core/identifiers/phone";
import { gpPractices } from "@withy/db/schema";
import { and, asc, eq, like, or } from "drizzle-orm";
import { verb } from "../verb";

const shownAtMost = 20;

/** Surgeries whose name or postcode starts with what was typed, in name order. */
export const listGpPractices = verb(
  "patients.read",
  listGpPracticesInput,
  async (ctx, { search }): Promise<GpPracticeView[]> => {
    const start = `${search.replace(/[\\%_]/g, "")}%`;
    const rows = await ctx.db
      .select()
      .from(gpPractices)
      .where(
        and(
          eq(gpPractices.practiceId, ctx.practiceId),
          or(
            like(gpPractices.name, start),
            like(gpPractices.name, `% ${start}`),
            like(gpPractices.postcode, start),
          ),
        ),
      )
      .orderBy(asc(gpPractices.name))
      .limit(shownAtMost);
    return rows.map(toGpPracticeView);
  },
);

export function toGpPracticeView(row: typeof gpPractices.$inferSelect): GpPracticeView {
  return {
    id: row.id,
    name: row.name,
    addressLines: row.addressLines,
    postcode: row.postcode,
    phone: row.phone === null ? null : formatPhone(row.phone),
    email: row.email,
  };
}
