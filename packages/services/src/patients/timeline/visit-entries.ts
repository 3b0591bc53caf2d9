import type { VisitEntry } from "@withy/contracts/patients";
import { sitesWith } from "@withy/core/access/can";
import { dayOf, minutesBetween, timeOf } from "@withy/core/zoned-time";
import { appointments, services, sites, staffMembers } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import type { Context } from "../../context";
import { atSites } from "../patient-counts";
import { olderThan, type Slice } from "./cursor";

/** Visits at the sites whose diary the person reads, on each site's own clock. */
export async function visitEntries(ctx: Context, { patientId, before, limit }: Slice): Promise<VisitEntry[]> {
  const rows = await ctx.db
    .select({
      visit: appointments,
      serviceName: services.name,
      siteName: sites.name,
      zone: sites.zone,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
    })
    .from(appointments)
    .innerJoin(
      services,
      and(eq(services.practiceId, appointments.practiceId), eq(services.id, appointments.serviceId)),
    )
    .innerJoin(sites, and(eq(sites.practiceId, appointments.practiceId), eq(sites.id, appointments.siteId)))
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
        eq(appointments.patientId, patientId),
        olderThan(appointments.startsAt, appointments.id, before),
        ...atSites(appointments.siteId, sitesWith(ctx.roles, "diary.read")),
      ),
    )
    .orderBy(desc(appointments.startsAt), desc(appointments.id))
    .limit(limit);
  return rows.map(({ visit, zone, ...row }) => ({
    kind: "visit",
    id: visit.id,
    at: visit.startsAt.toISOString(),
    day: dayOf(visit.startsAt, zone),
    time: timeOf(visit.startsAt, zone),
    state: visit.state,
    serviceName: row.serviceName,
    minutes: minutesBetween(visit.startsAt, visit.endsAt),
    therapistName: `${row.givenName} ${row.familyName}`,
    siteId: visit.siteId,
    siteName: row.siteName,
    cancelledBy: visit.cancelledBy,
    isLateCancellation: visit.isLateCancellation,
  }));
}
