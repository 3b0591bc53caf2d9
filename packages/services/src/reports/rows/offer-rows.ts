import type { FigureRow } from "@withy/contracts/reports";
import { dayOf } from "@withy/core/zoned-time";
import { minutesOf, totalMinutes } from "@withy/diary/interval";
import type { Context } from "../../context";
import { loadHours } from "../load-hours";
import type { ReportSite } from "../report-sites";
import type { Asked, RowsAnswer } from "./asked";

/** Working time on offer: one row for each therapist, site and day. */
export async function offerRows(
  ctx: Context,
  asked: Asked,
  sites: readonly ReportSite[],
): Promise<RowsAnswer> {
  const { offered, people } = await loadHours(ctx, asked.span, sites);
  const theirs = offered.filter(
    (o) => asked.therapistId === undefined || o.therapistId === asked.therapistId,
  );
  const byDay = new Map<string, FigureRow>();
  for (const { therapistId, siteId, zone, intervals } of theirs) {
    const siteName = sites.find((site) => site.id === siteId)?.name ?? "";
    for (const one of intervals) {
      const day = dayOf(new Date(one.from), zone);
      const id = `${day} ${therapistId} ${siteId}`;
      const minutes = (byDay.get(id)?.minutes ?? 0) + minutesOf(one);
      const title = people.get(therapistId) ?? "";
      byDay.set(id, { id, day, time: null, title, detail: siteName, minutes, pence: null, opens: null });
    }
  }
  const rows = [...byDay.values()].sort(
    (a, b) => a.day.localeCompare(b.day) || a.title.localeCompare(b.title),
  );
  return {
    rows: rows.slice(asked.offset, asked.offset + asked.limit),
    total: rows.length,
    sumMinutes: theirs.reduce((n, o) => n + totalMinutes(o.intervals), 0),
    sumPence: null,
  };
}
