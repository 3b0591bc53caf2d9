import { appointments, staffMembers } from "@withy/db/schema";
import type { AppointmentState } from "@withy/diary/appointment-states";
import { and, eq, gte, inArray, lt } from "drizzle-orm";
import type { Context } from "../context";
import type { MonthSpan } from "./month-span";

/** One visit of the month, as far as the figures need it. */
export interface MonthVisit {
  readonly therapistId: string;
  readonly therapistName: string;
  readonly siteId: string;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly state: AppointmentState;
  readonly isLate: boolean;
}

/** Every visit that starts in the month at these sites, whatever became of it. */
export async function loadVisits(ctx: Context, span: MonthSpan, siteIds: string[]): Promise<MonthVisit[]> {
  const rows = await ctx.db
    .select({
      therapistId: appointments.therapistId,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
      siteId: appointments.siteId,
      startsAt: appointments.startsAt,
      endsAt: appointments.endsAt,
      state: appointments.state,
      isLate: appointments.isLateCancellation,
    })
    .from(appointments)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, appointments.practiceId),
        eq(staffMembers.id, appointments.therapistId),
      ),
    )
    .where(
      and(
        eq(appointments.practiceId, ctx.practiceId),
        inArray(appointments.siteId, siteIds),
        gte(appointments.startsAt, span.from),
        lt(appointments.startsAt, span.to),
      ),
    );
  return rows.map(({ givenName, familyName, ...visit }) => ({
    ...visit,
    therapistName: `${givenName} ${familyName}`,
  }));
}
