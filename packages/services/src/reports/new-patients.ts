import { appointments } from "@withy/db/schema";
import { and, countDistinct, eq, gte, inArray, lt, notExists, type SQL, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Context } from "../context";
import type { MonthSpan } from "./month-span";

const earlier = alias(appointments, "earlier");

/** First attended visits: attended in the month at these sites, with none attended before, at any site. */
export function firstVisitWhere(ctx: Context, span: MonthSpan, siteIds: string[]): SQL | undefined {
  const before = ctx.db
    .select({ one: sql`1` })
    .from(earlier)
    .where(
      and(
        eq(earlier.practiceId, appointments.practiceId),
        eq(earlier.patientId, appointments.patientId),
        eq(earlier.state, "fulfilled"),
        lt(earlier.startsAt, appointments.startsAt),
      ),
    );
  return and(
    eq(appointments.practiceId, ctx.practiceId),
    inArray(appointments.siteId, siteIds),
    eq(appointments.state, "fulfilled"),
    gte(appointments.startsAt, span.from),
    lt(appointments.startsAt, span.to),
    notExists(before),
  );
}

export async function countNewPatients(ctx: Context, span: MonthSpan, siteIds: string[]): Promise<number> {
  const [row] = await ctx.db
    .select({ n: countDistinct(appointments.patientId) })
    .from(appointments)
    .where(firstVisitWhere(ctx, span, siteIds));
  return row?.n ?? 0;
}
