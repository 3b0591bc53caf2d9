import { type FigureKey, type FigureRowsView, listFigureRowsInput } from "@withy/contracts/reports";
import { recordAudit } from "../audit/record-audit";
import type { Context } from "../context";
import { verb } from "../verb";
import { monthSpan } from "./month-span";
import { type ReportSite, reportSites } from "./report-sites";
import type { Asked, RowsAnswer } from "./rows/asked";
import { billedRows, collectedRows } from "./rows/money-rows";
import { offerRows } from "./rows/offer-rows";
import { newPatientRows, visitRows } from "./rows/visit-rows";
import { isVisitFigure } from "./visit-figures";

/** The rows that one of a month's figures is made of, with the sums of all of them. */
export const listFigureRows = verb(
  "reports.read",
  listFigureRowsInput,
  async (ctx, { page, pageSize, ...input }): Promise<FigureRowsView> => {
    const { chosen } = await reportSites(ctx, input.siteId);
    const asked: Asked = {
      span: monthSpan(input.month, ctx.zone),
      siteIds: chosen.map((site) => site.id),
      therapistId: input.therapistId,
      payerKind: input.payerKind,
      limit: pageSize,
      offset: (page - 1) * pageSize,
    };
    const answer = await rowsOf(ctx, input.figure, asked, chosen);
    await recordAudit(ctx, {
      action: "report.rows-read",
      subjectKind: "practice",
      subjectId: ctx.practiceId,
      siteId: input.siteId ?? null,
      detail: { month: input.month, figure: input.figure },
    });
    return { ...answer, page, pageSize };
  },
);

function rowsOf(
  ctx: Context,
  figure: FigureKey,
  asked: Asked,
  sites: readonly ReportSite[],
): Promise<RowsAnswer> {
  if (isVisitFigure(figure)) return visitRows(ctx, asked, figure);
  if (figure === "billed") return billedRows(ctx, asked);
  if (figure === "collected") return collectedRows(ctx, asked);
  if (figure === "new-patients") return newPatientRows(ctx, asked);
  return offerRows(ctx, asked, sites);
}
