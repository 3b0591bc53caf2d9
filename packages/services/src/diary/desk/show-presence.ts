import {
  endPresenceInput,
  listPresenceInput,
  type OtherPerson,
  showPresenceInput,
} from "@withy/contracts/diary";
import { appointments, diaryPresence, staffMembers } from "@withy/db/schema";
import { and, asc, eq, gt, ne } from "drizzle-orm";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { requireReach } from "../../reach";
import { verb } from "../../verb";
import { presenceSeconds } from "../live/live-limits";

async function requireAppointment(ctx: Context, appointmentId: string): Promise<void> {
  const row = await loadRecord(ctx, appointments, appointmentId, "appointment");
  requireReach(ctx, "diary.read", row.siteId, "appointment");
}

/** Says that one has an appointment open, and whether to change it. Said again now and then, or it lapses. */
export const showPresence = verb("diary.read", showPresenceInput, async (ctx, input) => {
  await requireAppointment(ctx, input.appointmentId);
  const said = { isEditing: input.isEditing, seenAt: ctx.clock.now() };
  const who = {
    practiceId: ctx.practiceId,
    appointmentId: input.appointmentId,
    staffMemberId: ctx.staffMemberId,
  };
  await ctx.db
    .insert(diaryPresence)
    .values({ ...who, ...said })
    .onDuplicateKeyUpdate({ set: said });
  return { isShown: true };
});

/** Says that one has closed it. */
export const endPresence = verb("diary.read", endPresenceInput, async (ctx, input) => {
  await requireAppointment(ctx, input.appointmentId);
  await ctx.db
    .delete(diaryPresence)
    .where(
      and(
        eq(diaryPresence.practiceId, ctx.practiceId),
        eq(diaryPresence.appointmentId, input.appointmentId),
        eq(diaryPresence.staffMemberId, ctx.staffMemberId),
      ),
    );
  return { isShown: false };
});

/** Who else has the appointment open now. */
export const listPresence = verb(
  "diary.read",
  listPresenceInput,
  async (ctx, input): Promise<OtherPerson[]> => {
    await requireAppointment(ctx, input.appointmentId);
    const seenSince = new Date(ctx.clock.now().getTime() - presenceSeconds * 1000);
    const rows = await ctx.db
      .select({
        givenName: staffMembers.givenName,
        familyName: staffMembers.familyName,
        isEditing: diaryPresence.isEditing,
      })
      .from(diaryPresence)
      .innerJoin(
        staffMembers,
        and(
          eq(staffMembers.practiceId, diaryPresence.practiceId),
          eq(staffMembers.id, diaryPresence.staffMemberId),
        ),
      )
      .where(
        and(
          eq(diaryPresence.practiceId, ctx.practiceId),
          eq(diaryPresence.appointmentId, input.appointmentId),
          gt(diaryPresence.seenAt, seenSince),
          ne(diaryPresence.staffMemberId, ctx.staffMemberId),
        ),
      )
      .orderBy(asc(staffMembers.familyName), asc(staffMembers.id));
    return rows.map(({ givenName, familyName, isEditing }) => ({
      name: `${givenName} ${familyName}`,
      isEditing,
    }));
  },
);
