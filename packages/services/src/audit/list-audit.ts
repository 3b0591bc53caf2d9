import { type AuditPage, listAuditInput } from "@withy/contracts/audit";
import { addDays, dayBounds, dayOf, timeOf } from "@withy/core/zoned-time";
import { auditEvents, patients, sites, staffMembers } from "@withy/db/schema";
import { and, desc, eq, gte, lt, sql } from "drizzle-orm";
import type { z } from "zod";
import type { Context } from "../context";
import { verb } from "../verb";

/** Events beyond this are not counted: the filter is narrowed rather than paged that far. */
const countedAtMost = 1000;

/** Who did what, newest first, by person, patient, subject and days. */
export const listAudit = verb("audit.read", listAuditInput, async (ctx, input): Promise<AuditPage> => {
  const { page, pageSize } = input;
  const where = whereAudit(ctx, input);
  const [rows, counted] = await Promise.all([
    readRows(ctx, where, pageSize, (page - 1) * pageSize),
    countRows(ctx, where),
  ]);
  return {
    rows,
    page,
    pageSize,
    total: Math.min(counted, countedAtMost),
    isCutShort: counted > countedAtMost,
  };
});

function whereAudit(ctx: Context, input: z.output<typeof listAuditInput>) {
  const { actorId, patientId, subjectKind, from, until } = input;
  return and(
    eq(auditEvents.practiceId, ctx.practiceId),
    actorId === undefined ? undefined : eq(auditEvents.actorId, actorId),
    patientId === undefined ? undefined : eq(auditEvents.patientId, patientId),
    subjectKind === undefined ? undefined : eq(auditEvents.subjectKind, subjectKind),
    from === undefined ? undefined : gte(auditEvents.at, dayBounds(from, ctx.zone).from),
    until === undefined ? undefined : lt(auditEvents.at, dayBounds(addDays(until, 1), ctx.zone).from),
  );
}

async function readRows(ctx: Context, where: ReturnType<typeof whereAudit>, limit: number, offset: number) {
  const rows = await ctx.db
    .select({
      event: auditEvents,
      actorGiven: staffMembers.givenName,
      actorFamily: staffMembers.familyName,
      patientGiven: patients.givenName,
      patientFamily: patients.familyName,
      siteName: sites.name,
    })
    .from(auditEvents)
    .leftJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, auditEvents.practiceId), eq(staffMembers.id, auditEvents.actorId)),
    )
    .leftJoin(
      patients,
      and(eq(patients.practiceId, auditEvents.practiceId), eq(patients.id, auditEvents.patientId)),
    )
    .leftJoin(sites, and(eq(sites.practiceId, auditEvents.practiceId), eq(sites.id, auditEvents.siteId)))
    .where(where)
    .orderBy(desc(auditEvents.at), desc(auditEvents.id))
    .limit(limit)
    .offset(offset);
  return rows.map(({ event, ...names }) => ({
    id: event.id,
    day: dayOf(event.at, ctx.zone),
    time: timeOf(event.at, ctx.zone),
    actorName: names.actorGiven === null ? "Withy itself" : `${names.actorGiven} ${names.actorFamily}`,
    action: event.action,
    subjectKind: event.subjectKind,
    subjectId: event.subjectId,
    patientId: event.patientId,
    patientName: names.patientGiven === null ? null : `${names.patientGiven} ${names.patientFamily}`,
    siteName: names.siteName,
    detail: event.detail,
  }));
}

async function countRows(ctx: Context, where: ReturnType<typeof whereAudit>): Promise<number> {
  const some = ctx.db
    .select({ id: auditEvents.id })
    .from(auditEvents)
    .where(where)
    .limit(countedAtMost + 1)
    .as("some");
  const [row] = await ctx.db.select({ n: sql<number>`count(*)`.mapWith(Number) }).from(some);
  return row?.n ?? 0;
}
