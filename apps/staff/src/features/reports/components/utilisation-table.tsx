import type { MonthView, UtilisationRow } from "@withy/contracts/reports";
import { SectionHead } from "@withy/ui/section-head";
import type { CSSProperties } from "react";
import { hoursWords, noData, pointsWords } from "../figure-words";
import { monthOn, shortMonth } from "../month-address";
import type { FigureAsked } from "./figure-asked";
import { Opens } from "./figure-sheet";

/** How full: by therapist, by site, and all, against the target line. */
export function UtilisationTable({ month }: { month: MonthView }) {
  const target = { "--target": `${month.targetPercent}%` } as CSSProperties;
  return (
    <section aria-labelledby="utilisation-title" style={target}>
      <SectionHead
        id="utilisation-title"
        title="Utilisation"
        aside="percent of hours on offer"
        action={
          <span className="barkey small" aria-hidden="true">
            <i className="sw dl" />
            delivered <i className="sw bk" />
            booked <i className="sw tg" />
            target {month.targetPercent}
          </span>
        }
      />
      <table className="acc ut">
        <caption className="vh">Utilisation by therapist and by site</caption>
        <thead>
          <tr>
            <th scope="col">Therapist</th>
            <th scope="col" className="where">
              Site
            </th>
            <td className="b" />
            <th scope="col" className="n">
              booked
            </th>
            <th scope="col" className="n">
              delivered
            </th>
            <th scope="col" className="n">
              hours
            </th>
            <th scope="col" className="n">
              {beforeWords(month.month)}
            </th>
          </tr>
        </thead>
        <tbody>
          {month.therapists.map((row) => (
            <Row key={row.id} row={row} asked={{ therapistId: row.id, who: row.name }} />
          ))}
        </tbody>
        <tbody>
          {month.bySite.map((row) => (
            <Row key={row.id} row={row} asked={{ siteId: row.id, who: row.name }} />
          ))}
        </tbody>
        <tfoot>
          <Row row={month.whole} asked={{}} />
        </tfoot>
      </table>
    </section>
  );
}

function Row({ row, asked }: { row: UtilisationRow; asked: Omit<FigureAsked, "figure"> }) {
  const points = (share: number | null) => (share === null ? noData : Math.round(share / 100));
  return (
    <tr>
      <th scope="row">{row.name}</th>
      <td className="soft where">{row.siteNames.join(", ")}</td>
      <td className="b">
        <span className="ub" aria-hidden="true">
          <i className="bk" style={{ width: barWidth(row.booked) }} />
          <i className="dl" style={{ width: barWidth(row.delivered) }} />
        </span>
      </td>
      <td className="n">
        <Opens asked={{ figure: "booked", ...asked }}>{points(row.booked)}</Opens>
      </td>
      <td className="n">
        <Opens asked={{ figure: "delivered", ...asked }}>{points(row.delivered)}</Opens>
      </td>
      <td className="n soft">
        <Opens asked={{ figure: "on-offer", ...asked }}>{hoursWords(row.onOfferMinutes)}</Opens>
      </td>
      <td className="n soft">{pointsWords(row.booked, row.bookedBefore)}</td>
    </tr>
  );
}

/** "on Oct": which month the last column compares with. */
function beforeWords(month: string): string {
  return `on ${shortMonth(monthOn(month, -1))}`;
}

/** Overtime may take a share past the whole; the bar stops at its end, the figure does not. */
function barWidth(share: number | null): string {
  return `${Math.min(100, (share ?? 0) / 100)}%`;
}
