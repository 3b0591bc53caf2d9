import "@/features/reports/bars.css";
import "@/features/reports/reports.css";
import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { getMonth } from "@withy/services/reports";
import { Page } from "@withy/ui/page";
import type { Metadata } from "next";
import { Definitions } from "@/features/reports/components/definitions";
import { FigureLine } from "@/features/reports/components/figure-line";
import { FigureSheet } from "@/features/reports/components/figure-sheet";
import { HeatTable } from "@/features/reports/components/heat-table";
import { DebtTable, IncomeTable } from "@/features/reports/components/money-tables";
import { MonthTitle } from "@/features/reports/components/month-title";
import { UtilisationTable } from "@/features/reports/components/utilisation-table";
import { usualMonth } from "@/features/reports/month-address";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Month" };

export default async function MonthPage({ searchParams }: PageProps<"/reports/month">) {
  const ctx = await requireContext("reports.read");
  const query = await searchParams;
  const asked = typeof query["month"] === "string" ? query["month"] : null;
  const siteId = typeof query["siteId"] === "string" ? query["siteId"] : "";
  const today = dayOf(ctx.clock.now(), ctx.zone);
  const month = await orNotFound(getMonth(ctx, { month: asked ?? usualMonth(today), siteId }));
  return (
    <Page className="month">
      <FigureSheet month={month.month} siteId={month.site?.id ?? null}>
        <MonthTitle month={month} />
        <FigureLine month={month} />
        <div className="mcols">
          <UtilisationTable month={month} />
          <HeatTable heat={month.heat} where={month.site?.name ?? "all sites"} />
        </div>
        <div className="mcols last">
          <IncomeTable month={month} />
          {month.debts && (
            <DebtTable
              debts={month.debts}
              asAt={plainDateWords(month.today)}
              siteId={month.site?.id ?? null}
            />
          )}
          <Definitions figures={month.figures} />
        </div>
      </FigureSheet>
    </Page>
  );
}
