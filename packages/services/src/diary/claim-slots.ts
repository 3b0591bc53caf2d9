import { isDuplicate } from "@withy/db/database-error";
import { diaryClaims } from "@withy/db/schema";
import { slotsOf } from "@withy/diary/slots";
import { and, eq, sql } from "drizzle-orm";
import type { Context } from "../context";
import { rowsOf, sqlTime } from "./raw-rows";

/** The stretch of a therapist's and a room's time that one visit needs, clean-down included. */
export interface Claim {
  readonly appointmentId: string;
  readonly therapistId: string;
  readonly roomId: string;
  readonly startsAt: Date;
  /** With the clean-down. */
  readonly until: Date;
}

/** Which other visit or class holds a slot of the claim, or null. */
export async function findHolder(ctx: Context, claim: Claim): Promise<string | null> {
  const rows = await rowsOf<{ holder: string }>(
    ctx.db,
    sql`select coalesce(c.appointment_id, c.class_session_id) as holder from diary_claims c
      where c.practice_id = ${ctx.practiceId} and c.resource_id in (${claim.therapistId}, ${claim.roomId})
        and c.slot_at >= ${sqlTime(claim.startsAt)} and c.slot_at < ${sqlTime(claim.until)}
        and not (c.appointment_id <=> ${claim.appointmentId}) order by c.slot_at limit 1`,
  );
  return rows[0]?.holder ?? null;
}

/**
 * Takes the slots for the visit. The primary key of the claims decides every race.
 * @returns whether they are now this visit's
 */
export async function claimSlots(ctx: Context, claim: Claim): Promise<boolean> {
  // One order of resources for everyone, so that two claims on the same pair cannot wait for each other.
  const resources = [claim.therapistId, claim.roomId].sort();
  const slots = slotsOf(claim.startsAt, claim.until);
  const rows = resources.flatMap((resourceId) =>
    slots.map((slotAt) => ({
      practiceId: ctx.practiceId,
      resourceId,
      slotAt,
      appointmentId: claim.appointmentId,
    })),
  );
  try {
    await ctx.db.insert(diaryClaims).values(rows);
    return true;
  } catch (error) {
    if (isDuplicate(error, "PRIMARY")) return false;
    throw error;
  }
}

export async function releaseSlots(ctx: Context, appointmentId: string): Promise<void> {
  await ctx.db
    .delete(diaryClaims)
    .where(and(eq(diaryClaims.practiceId, ctx.practiceId), eq(diaryClaims.appointmentId, appointmentId)));
}
