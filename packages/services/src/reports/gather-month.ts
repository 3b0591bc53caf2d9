import { sumPence } from "@withy/core/money";
import type { Context } from "../context";
import { loadHours } from "./load-hours";
import { loadBilled, loadCollected } from "./load-money";
import { loadVisits } from "./load-visits";
import { monthSpan } from "./month-span";
import { countNewPatients } from "./new-patients";
import { reckonUtilisation } from "./reckon-utilisation";
import type { ReportSite } from "./report-sites";
import { counts, type VisitFigure } from "./visit-figures";

/** Everything that a month's figures are made of. Each read is bounded by the month and by an index. */
export async function gatherMonth(ctx: Context, month: string, sites: readonly ReportSite[]) {
  const span = monthSpan(month, ctx.zone);
  const siteIds = sites.map((site) => site.id);
  const [{ offered, people }, visits, billed, collected, newPatients] = await Promise.all([
    loadHours(ctx, span, sites),
    loadVisits(ctx, span, siteIds),
    loadBilled(ctx, span, siteIds),
    loadCollected(ctx, span, siteIds),
    countNewPatients(ctx, span, siteIds),
  ]);
  const cells = reckonUtilisation(offered, visits);
  const countOf = (figure: VisitFigure) => visits.filter((v) => counts(figure, v.state)).length;
  const names = new Map([
    ...visits.map((v) => [v.therapistId, v.therapistName] as const),
    ...people.entries(),
  ]);
  return {
    span,
    offered,
    visits,
    names,
    cells,
    billed,
    billedPence: sumPence(billed.map((b) => b.netPence)),
    collected,
    newPatients,
    attended: countOf("attended"),
    missed: countOf("did-not-attend"),
    due: countOf("due"),
    cancelled: countOf("cancelled"),
    late: visits.filter((v) => v.state === "cancelled" && v.isLate).length,
    all: visits.length,
  };
}

export type MonthFacts = Awaited<ReturnType<typeof gatherMonth>>;
