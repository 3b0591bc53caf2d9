import { ageBucketWords, bucketOfDays } from "@withy/billing/ageing";
import type { InvoiceKind, InvoiceListView, InvoiceRowView, InvoiceSumsView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { formatMoney, type Pence } from "@withy/core/money";
import Link from "next/link";

const figure = (pence: Pence): string => formatMoney(pence).replace("£", "");
const longestBar = 150;

interface InvoiceTableProps {
  list: InvoiceListView;
  kind: InvoiceKind;
  /** The rows of the filter before, while the new ones are on their way. */
  isStale?: boolean;
}

/** The account book: a line an invoice, its age in the margin, the page's and the filter's sums at the foot. */
export function InvoiceTable({ list, kind, isStale = false }: InvoiceTableProps) {
  const isOwed = kind === "owed" || kind === "overdue";
  return (
    <div className="tblw" aria-busy={isStale || undefined}>
      <table className="acc big">
        <caption className="vh">
          {isOwed ? "Invoices owed, oldest due first" : "Invoices, newest first"}
        </caption>
        <thead>
          <tr>
            <td className="gcell" />
            <th scope="col">Number</th>
            <th scope="col" className="wide">
              Issued
            </th>
            <th scope="col" aria-sort={isOwed ? "ascending" : undefined}>
              Due
            </th>
            <th scope="col">Patient</th>
            <th scope="col">Payer</th>
            <th scope="col" className="wide">
              Site
            </th>
            <th scope="col" className="n mid">
              Total
            </th>
            <th scope="col" className="n mid">
              Paid
            </th>
            <th scope="col" className="n">
              Owed £
            </th>
            <th scope="col" className="agec wide">
              Past due, to {longestBar} days
            </th>
            <th scope="col" className="n">
              Age
            </th>
            <th scope="col">State</th>
          </tr>
        </thead>
        <tbody>
          {list.rows.map((row, i) => (
            <InvoiceLine
              key={row.id}
              row={row}
              before={list.rows[i - 1]}
              today={list.today}
              isAged={isOwed}
            />
          ))}
        </tbody>
        <tfoot>
          {list.total > list.rows.length && <Sums label={`These ${list.rows.length}`} sums={list.pageSums} />}
          <Sums label={`All ${list.total}`} sums={list.filterSums} />
        </tfoot>
      </table>
    </div>
  );
}

interface InvoiceLineProps {
  row: InvoiceRowView;
  before: InvoiceRowView | undefined;
  today: string;
  isAged: boolean;
}

/** The margin names an age once, at the first line that has it. */
const ageOf = (row: InvoiceRowView): string =>
  ageBucketWords[row.daysPastDue < 0 ? "not-due" : bucketOfDays(row.daysPastDue)];

function ageWords(row: InvoiceRowView): string {
  if (row.owedPence === 0) return "";
  if (row.daysPastDue === 0) return "due today";
  if (row.daysPastDue < 0) return "not due";
  return row.daysPastDue === 1 ? "1 day" : `${row.daysPastDue} days`;
}

function InvoiceLine({ row, before, today, isAged }: InvoiceLineProps) {
  const isFirst = isAged && (before === undefined || ageOf(before) !== ageOf(row));
  const share = Math.min(100, Math.max(0, (row.daysPastDue / longestBar) * 100));
  return (
    <tr>
      <td className="gcell note">{isFirst ? ageOf(row) : ""}</td>
      <th scope="row" className="num">
        <Link href={`/billing/invoices/${row.id}`}>{row.reference}</Link>
      </th>
      <td className="num soft wide">{shortDate(row.issuedOn, today)}</td>
      <td className="num" data-label="Due">
        {shortDate(row.dueOn, today)}
      </td>
      <td data-label="Patient">{row.patientName}</td>
      <td data-label="Payer">{row.payerName ?? "patient"}</td>
      <td className="soft wide">{row.siteName}</td>
      <td className="n mid" data-label="Total">
        {figure(row.totalPence)}
      </td>
      <td className="n soft mid" data-label="Paid">
        {row.paidPence === 0 ? "" : figure(row.paidPence)}
      </td>
      <td className="n owedcol" data-label="Owed £">
        <b>{figure(row.owedPence)}</b>
      </td>
      <td className="agec wide">
        {row.owedPence > 0 && (
          <span className="ageb">
            <i style={{ width: `${share}%` }} />
          </span>
        )}
      </td>
      <td className={row.daysPastDue > 90 && row.owedPence > 0 ? "n danger" : "n"} data-label="Age">
        {ageWords(row)}
      </td>
      <td data-label="State">{row.stateWord.toLowerCase()}</td>
    </tr>
  );
}

function Sums({ label, sums }: { label: string; sums: InvoiceSumsView }) {
  return (
    <tr>
      <td className="gcell" />
      <th scope="row">{label}</th>
      <td className="wide" />
      <td className="skip" />
      <td className="skip" />
      <td className="skip" />
      <td className="wide" />
      <td className="n mid" data-label="Total">
        {figure(sums.totalPence)}
      </td>
      <td className="n mid" data-label="Paid">
        {figure(sums.paidPence)}
      </td>
      <td className="n owedcol" data-label="Owed £">
        {figure(sums.owedPence)}
      </td>
      <td className="wide" />
      <td className="skip" />
      <td className="skip" />
    </tr>
  );
}
