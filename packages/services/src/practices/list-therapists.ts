import { listTherapistsInput, type TherapistView } from "@withy/contracts/practices";
import { staffMembers } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import { verb } from "../verb";

/** The practice's working therapists, in the practice's own order. */
export const listTherapists = verb(
  "practice.read",
  listTherapistsInput,
  async (ctx): Promise<TherapistView[]> => {
    const rows = await ctx.db
      .select()
      .from(staffMembers)
      .where(
        and(
          eq(staffMembers.practiceId, ctx.practiceId),
          eq(staffMembers.isTherapist, true),
          eq(staffMembers.isActive, true),
        ),
      )
      .orderBy(asc(staffMembers.position));
    return rows.map((row) => ({
      id: row.id,
      name: `${row.givenName} ${row.familyName}`,
      jobTitle: row.jobTitle,
      homeSiteId: row.homeSiteId,
    }));
  },
);
