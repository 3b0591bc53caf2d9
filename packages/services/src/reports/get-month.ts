import { getMonthInput, type IncomeRow, type MonthView, payerKinds } from "@withy/contracts/reports";
import { can } from "@withy/core/access/can";
import { notFound } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { practices } from "@withy/db/schema";
import { eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import { getAgedDebt } from "../billing/get-aged-debt";
import { verb } from "../verb";
import { pencePerHour, perEach } from "./arithmetic";
import { gatherMonth, type MonthFacts } from "./gather-month";
import { monthFigures, utilisationRow } from "./month-figures";
import { monthBefore } from "./month-span";
import { reckonHeat } from "./reckon-utilisation";
import { type ReportSite, reportSites } from "./report-sites";

/** One month of the practice: how full, how much money, how many people; every figure with what it is made of. */
export const getMonth = verb(
  "reports.read",
  getMonthInput,
  async (ctx, { month, siteId }): Promise<MonthView> => {
    const { readable, chosen } = await reportSites(ctx, siteId);
    const [practice] = await ctx.db.select().from(practices).where(eq(practices.id, ctx.practiceId)).limit(1);
    if (!practice) throw notFound("practice");
    const [facts, before, debts] = await Promise.all([
      gatherMonth(ctx, month, chosen),
      gatherMonth(ctx, monthBefore(month), chosen),
      can(ctx.roles, "billing.read") ? getAgedDebt(ctx, siteId === undefined ? {} : { siteId }) : null,
    ]);
    await recordAudit(ctx, {
      action: "report.read",
      subjectKind: "practice",
      subjectId: ctx.practiceId,
      siteId: siteId ?? null,
      detail: { month },
    });
    const today = dayOf(ctx.clock.now(), ctx.zone);
    const named = ({ id, name }: ReportSite) => ({ id, name });
    const whole = utilisationRow(facts.cells, before.cells, { id: "whole", name: "All", siteNames: [] });
    const zoneOf = (id: string) => readable.find((site) => site.id === id)?.zone ?? ctx.zone;
    return {
      month,
      firstOn: facts.span.firstOn,
      lastOn: facts.span.lastOn,
      isOver: facts.span.lastOn < today,
      today,
      practiceName: practice.name,
      site: siteId === undefined ? null : (chosen.map(named)[0] ?? null),
      sites: readable.map(named),
      targetPercent: practice.utilisationTarget,
      figures: monthFigures(facts, before),
      visitsPerNewPatient: perEach(facts.attended, facts.newPatients),
      pencePerAttendedHour: pencePerHour(facts.billedPence, whole.deliveredMinutes),
      lateCancellations: facts.late,
      ...utilisation(facts, before, chosen),
      whole,
      heat: reckonHeat(facts.offered, facts.visits, zoneOf),
      income: incomeRows(facts, before),
      debts,
    };
  },
);

function utilisation(facts: MonthFacts, before: MonthFacts, sites: readonly ReportSite[]) {
  const therapists = [...facts.names].map(([id, name]) => {
    const own = facts.cells.filter((cell) => cell.therapistId === id);
    const siteNames = sites.filter((s) => own.some((cell) => cell.siteId === s.id)).map((s) => s.name);
    const earlier = before.cells.filter((cell) => cell.therapistId === id);
    return utilisationRow(own, earlier, { id, name, siteNames });
  });
  const bySite = sites.map(({ id, name }) =>
    utilisationRow(
      facts.cells.filter((cell) => cell.siteId === id),
      before.cells.filter((cell) => cell.siteId === id),
      { id, name, siteNames: [] },
    ),
  );
  return { therapists: therapists.sort((a, b) => (b.booked ?? -1) - (a.booked ?? -1)), bySite };
}

function incomeRows(facts: MonthFacts, before: MonthFacts): IncomeRow[] {
  return payerKinds.map((kind) => {
    const now = facts.billed.find((row) => row.kind === kind);
    return {
      kind,
      invoices: now?.invoices ?? 0,
      netPence: now?.netPence ?? 0,
      netPenceBefore: before.billed.find((row) => row.kind === kind)?.netPence ?? 0,
    };
  });
}
