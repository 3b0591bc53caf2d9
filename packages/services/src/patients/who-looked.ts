import type { Page } from "@withy/contracts/page";
import { type LookView, whoLookedInput } from "@withy/contracts/patients";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { auditEvents, patients, staffMembers } from "@withy/db/schema";
import { and, count, desc, eq } from "drizzle-orm";
import { loadRecord } from "../load-record";
import { verb } from "../verb";

/** Who opened or changed a patient's record, newest first. */
export const whoLooked = verb(
  "audit.read",
  whoLookedInput,
  async (ctx, { patientId, page, pageSize }): Promise<Page<LookView>> => {
    await loadRecord(ctx, patients, patientId, "patient");
    const ofPatient = and(eq(auditEvents.practiceId, ctx.practiceId), eq(auditEvents.patientId, patientId));
    const rows = await ctx.db
      .select({
        id: auditEvents.id,
        at: auditEvents.at,
        action: auditEvents.action,
        givenName: staffMembers.givenName,
        familyName: staffMembers.familyName,
        jobTitle: staffMembers.jobTitle,
      })
      .from(auditEvents)
      .leftJoin(
        staffMembers,
        and(eq(staffMembers.practiceId, auditEvents.practiceId), eq(staffMembers.id, auditEvents.actorId)),
      )
      .where(ofPatient)
      .orderBy(desc(auditEvents.at), desc(auditEvents.id))
      .limit(pageSize)
      .offset((page - 1) * pageSize);
    const [total] = await ctx.db.select({ n: count() }).from(auditEvents).where(ofPatient);
    return {
      rows: rows.map((row) => ({
        id: row.id,
        at: row.at.toISOString(),
        day: dayOf(row.at, ctx.zone),
        time: timeOf(row.at, ctx.zone),
        staffName: row.givenName === null ? "Withy itself" : `${row.givenName} ${row.familyName}`,
        jobTitle: row.jobTitle ?? "",
        action: row.action,
      })),
      page,
      pageSize,
      total: total?.n ?? 0,
    };
  },
);
