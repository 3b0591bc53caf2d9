import { absences, siteClosures, siteHours, staffMembers, workingPatterns } from "@withy/db/schema";
import { openIntervals, workingIntervals } from "@withy/diary/availability";
import { bankHolidayOn } from "@withy/diary/bank-holidays";
import { dayClocks } from "@withy/diary/day-clock";
import { type Interval, interval, subtract, union } from "@withy/diary/interval";
import type { WorkingPattern } from "@withy/diary/working-pattern";
import { and, asc, between, eq, gt, gte, inArray, isNotNull, isNull, lt, lte, or } from "drizzle-orm";
import type { Context } from "../context";
import type { MonthSpan } from "./month-span";
import type { ReportSite } from "./report-sites";

/** What one therapist had on offer at one site in the month. */
export interface Offered {
  readonly therapistId: string;
  readonly siteId: string;
  readonly zone: string;
  readonly intervals: readonly Interval[];
}

interface Pattern extends WorkingPattern {
  readonly therapistName: string;
}

/**
 * Working time on offer: patterns within opening hours, less breaks, leave, blocks, closures and bank holidays.
 * People who have left since are counted for the time they worked.
 */
export async function loadHours(ctx: Context, span: MonthSpan, sites: readonly ReportSite[]) {
  const ids = sites.map((site) => site.id);
  const [patterns, hours, closures] = await Promise.all([
    listPatterns(ctx, span, ids),
    ctx.db
      .select()
      .from(siteHours)
      .where(and(eq(siteHours.practiceId, ctx.practiceId), inArray(siteHours.siteId, ids))),
    ctx.db
      .select()
      .from(siteClosures)
      .where(
        and(
          eq(siteClosures.practiceId, ctx.practiceId),
          inArray(siteClosures.siteId, ids),
          between(siteClosures.closedOn, span.firstOn, span.lastOn),
        ),
      ),
  ]);
  const people = new Map(patterns.map((p) => [p.staffMemberId, p.therapistName]));
  const away = await listAbsences(ctx, span, [...people.keys()]);
  const offered: Offered[] = sites.flatMap((site) => {
    const days = dayClocks(span.from, span.to, site.zone);
    const shut = days.filter((d) => bankHolidayOn(site.nation, d.day) !== null).map((d) => d.day);
    const closed = closures.filter((c) => c.siteId === site.id).map((c) => c.closedOn);
    const own = hours.filter((h) => h.siteId === site.id);
    const open = openIntervals(
      { siteId: site.id, hours: own, closedOn: new Set([...shut, ...closed]) },
      days,
    );
    return [...people.keys()].map((therapistId) => {
      const theirs = patterns.filter((p) => p.staffMemberId === therapistId);
      const working = workingIntervals(site.id, theirs, open, days);
      const intervals = subtract(working, union(away.get(therapistId) ?? []));
      return { therapistId, siteId: site.id, zone: site.zone, intervals };
    });
  });
  return { offered: offered.filter((o) => o.intervals.length > 0), people };
}

async function listPatterns(ctx: Context, span: MonthSpan, siteIds: string[]): Promise<Pattern[]> {
  const rows = await ctx.db
    .select({
      pattern: workingPatterns,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
    })
    .from(workingPatterns)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, workingPatterns.practiceId),
        eq(staffMembers.id, workingPatterns.staffMemberId),
      ),
    )
    .where(
      and(
        eq(workingPatterns.practiceId, ctx.practiceId),
        inArray(workingPatterns.siteId, siteIds),
        lte(workingPatterns.validFrom, span.lastOn),
        or(isNull(workingPatterns.validUntil), gte(workingPatterns.validUntil, span.firstOn)),
      ),
    )
    .orderBy(asc(staffMembers.position));
  return rows.map(({ pattern, givenName, familyName }) => ({
    ...pattern,
    therapistName: `${givenName} ${familyName}`,
  }));
}

async function listAbsences(
  ctx: Context,
  span: MonthSpan,
  people: string[],
): Promise<Map<string, Interval[]>> {
  const rows = await ctx.db
    .select()
    .from(absences)
    .where(
      and(
        eq(absences.practiceId, ctx.practiceId),
        isNotNull(absences.staffMemberId),
        inArray(absences.staffMemberId, people),
        gt(absences.endsAt, span.from),
        lt(absences.startsAt, span.to),
      ),
    );
  const away = new Map<string, Interval[]>();
  for (const row of rows) {
    if (row.staffMemberId === null) continue;
    const known = away.get(row.staffMemberId) ?? [];
    away.set(row.staffMemberId, [...known, interval(row.startsAt, row.endsAt)]);
  }
  return away;
}
