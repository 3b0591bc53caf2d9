import { type AgeBucket, ageBuckets, bucketOf } from "@withy/billing/ageing";
import { type AgedDebtView, agedDebtInput } from "@withy/contracts/billing";
import { sumPence } from "@withy/core/money";
import { dayOf } from "@withy/core/zoned-time";
import { invoices, payers } from "@withy/db/schema";
import { asc, eq, sql } from "drizzle-orm";
import { verb } from "../verb";
import { owedColumn, whereInvoices } from "./invoice-filter";

/** What is owed by age from the due date, what is not yet due apart; with the payers to filter by. */
export const getAgedDebt = verb("billing.read", agedDebtInput, async (ctx, input): Promise<AgedDebtView> => {
  const today = dayOf(ctx.clock.now(), ctx.zone);
  const byDueDate = await ctx.db
    .select({ dueOn: invoices.dueOn, count: sql<string>`count(*)`, owed: sql<string>`sum(${owedColumn})` })
    .from(invoices)
    .where(whereInvoices(ctx.practiceId, ctx.roles, { kind: "owed", siteId: input.siteId }, today))
    .groupBy(invoices.dueOn);
  const days = byDueDate.map((row) => {
    const dueOn = row.dueOn ?? today;
    const owedPence = Number(row.owed);
    return {
      bucket: bucketOf({ issuedOn: dueOn, dueOn, owedPence }, today, "due"),
      owedPence,
      count: Number(row.count),
    };
  });
  const inBucket = (bucket: AgeBucket) => days.filter((d) => d.bucket === bucket);
  const buckets = ageBuckets.map((bucket) => ({
    bucket,
    count: inBucket(bucket).reduce((sum, d) => sum + d.count, 0),
    pence: sumPence(inBucket(bucket).map((d) => d.owedPence)),
  }));
  const known = await ctx.db
    .select({ id: payers.id, name: payers.name })
    .from(payers)
    .where(eq(payers.practiceId, ctx.practiceId))
    .orderBy(asc(payers.name));
  return {
    today,
    count: buckets.reduce((sum, b) => sum + b.count, 0),
    totalPence: sumPence(buckets.map((b) => b.pence)),
    buckets,
    payers: known,
  };
});
