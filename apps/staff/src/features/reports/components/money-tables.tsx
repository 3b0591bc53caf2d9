import { ageBucketWords } from "@withy/billing/ageing";
import type { AgedDebtView } from "@withy/contracts/billing";
import type { MonthView } from "@withy/contracts/reports";
import { formatMoney, sumPence } from "@withy/core/money";
import { Money } from "@withy/ui/money";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { payerKindWords } from "../figure-words";
import { Opens } from "./figure-sheet";

const share = (part: number, whole: number) => (whole <= 0 ? 0 : Math.min(100, (part / whole) * 100));

/** Billed in the month, before VAT, by who pays. */
export function IncomeTable({ month }: { month: MonthView }) {
  const most = Math.max(...month.income.map((row) => row.netPence));
  const perHour = month.pencePerAttendedHour;
  return (
    <section aria-labelledby="income-title">
      <SectionHead id="income-title" title="Income" aside="billed in the month, before VAT" />
      <table className="acc">
        <caption className="vh">Billed by who pays</caption>
        <tbody>
          {month.income.map((row) => (
            <tr key={row.kind}>
              <th scope="row">{payerKindWords[row.kind]}</th>
              <td className="b">
                <span className="ib" aria-hidden="true">
                  <i style={{ width: `${share(row.netPence, most)}%` }} />
                </span>
              </td>
              <td className="n">
                <Opens asked={{ figure: "billed", payerKind: row.kind, who: payerKindWords[row.kind] }}>
                  <Money pence={row.netPence} />
                </Opens>
              </td>
              <td className="n soft">{differenceWords(row.netPence, row.netPenceBefore)}</td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <td>Billed</td>
            <td className="b" />
            <td className="n">
              <Money pence={sumPence(month.income.map((row) => row.netPence))} />
            </td>
            <td />
          </tr>
        </tfoot>
      </table>
      <p className="small soft">
        {perHour === null
          ? "No attended hours, so no income for each."
          : `${formatMoney(perHour)} billed for each attended hour.`}
      </p>
    </section>
  );
}

function differenceWords(now: number, before: number): string {
  if (before === 0) return now === 0 ? "" : "new";
  const percent = Math.round(((now - before) / before) * 100);
  return percent === 0 ? "0%" : `${percent > 0 ? "+" : "−"}${Math.abs(percent)}%`;
}

interface DebtTableProps {
  debts: AgedDebtView;
  asAt: string;
  /** Null: every site. */
  siteId: string | null;
}

/** What is owed as it stands today, by age from the due date. */
export function DebtTable({ debts, asAt, siteId }: DebtTableProps) {
  const most = Math.max(...debts.buckets.map((row) => row.pence));
  return (
    <section aria-labelledby="debts-title">
      <SectionHead
        id="debts-title"
        title="Owed to us"
        aside={`by days past due, as it stands on ${asAt}`}
        action={<Link href="/billing">who</Link>}
      />
      <table className="acc">
        <caption className="vh">Owed by age</caption>
        <tbody>
          {debts.buckets.map((row, i) => (
            <tr key={row.bucket}>
              <th scope="row">{ageBucketWords[row.bucket]}</th>
              <td className="b">
                <span className={`ib age${i}`} aria-hidden="true">
                  <i style={{ width: `${share(row.pence, most)}%` }} />
                </span>
              </td>
              <td className="n">
                <Link
                  className="opens"
                  href={`/billing?age=${row.bucket}${siteId === null ? "" : `&site=${siteId}`}`}
                >
                  <Money pence={row.pence} />
                </Link>
              </td>
              <td className="n soft">{row.count}</td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <td>Owed</td>
            <td className="b" />
            <td className="n">
              <Money pence={debts.totalPence} />
            </td>
            <td className="n">{debts.count}</td>
          </tr>
        </tfoot>
      </table>
    </section>
  );
}
