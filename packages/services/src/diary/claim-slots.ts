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
  try {
    await claimWrite(ctx, claim);
    return true;
  } catch (error) {
    if (isSlotTaken(error)) return false;
    throw error;
  }
}

/** The statement that takes the slots, to run with others. It fails as `isSlotTaken` where someone else has one. */
export function claimWrite(ctx: Context, claim: Claim) {
  // One order of resources for everyone, so that two claims on the same pair cannot wait for each other.
  const resources = [claim.therapistId, claim.roomId].sort();
  const slots = slotsOf(claim.startsAt, claim.until);
  const { practiceId } = ctx;
  const { appointmentId } = claim;
  return ctx.db
    .insert(diaryClaims)
    .values(
      resources.flatMap((resourceId) =>
        slots.map((slotAt) => ({ practiceId, resourceId, slotAt, appointmentId })),
      ),
    );
}

/** The other tables' primary keys are fresh ids, so a duplicate one is a slot. */
export const isSlotTaken = (error: unknown): boolean => isDuplicate(error, "PRIMARY");

export async function releaseSlots(ctx: Context, appointmentId: string): Promise<void> {
  await ctx.db
    .delete(diaryClaims)
    .where(and(eq(diaryClaims.practiceId, ctx.practiceId), eq(diaryClaims.appointmentId, appointmentId)));
}
