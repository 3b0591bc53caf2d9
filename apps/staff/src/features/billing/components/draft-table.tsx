import type { DraftView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { formatMoney, type Pence } from "@withy/core/money";
import Link from "next/link";

const figure = (pence: Pence): string => formatMoney(pence).replace("£", "");

interface DraftTableProps {
  drafts: readonly DraftView[];
  totalPence: Pence;
  today: string;
  chosenIds: readonly string[];
  /** Null where this person may not issue. */
  onChoose: ((ids: readonly string[]) => void) | null;
}

function contents(draft: DraftView): string {
  const visits = `${draft.visits} ${draft.visits === 1 ? "visit" : "visits"}`;
  return draft.items === 0 ? visits : `${visits}, ${draft.items} ${draft.items === 1 ? "item" : "items"}`;
}

function days({ firstOn, lastOn }: DraftView, today: string): string {
  if (firstOn === null || lastOn === null) return "";
  const last = shortDate(lastOn, today);
  return firstOn === lastOn ? last : `${shortDate(firstOn, today)} to ${last}`;
}

/** Drafts with their tick boxes in the margin. */
export function DraftTable({ drafts, totalPence, today, chosenIds, onChoose }: DraftTableProps) {
  const isAll = chosenIds.length === drafts.length;
  const toggle = (id: string) =>
    onChoose?.(chosenIds.includes(id) ? chosenIds.filter((one) => one !== id) : [...chosenIds, id]);
  return (
    <div className="tblw">
      <table className="acc big">
        <caption className="vh">Drafts to issue</caption>
        <thead>
          <tr>
            <td className="gcell">
              {onChoose && (
                <label className="tickbox">
                  <span className="note">{isAll ? "none" : "all"}</span>
                  <input
                    type="checkbox"
                    checked={isAll}
                    onChange={() => onChoose(isAll ? [] : drafts.map((d) => d.id))}
                    aria-label="Choose every draft"
                  />
                </label>
              )}
            </td>
            <th scope="col">Patient</th>
            <th scope="col">Payer</th>
            <th scope="col">For</th>
            <th scope="col">Days</th>
            <th scope="col" className="wide">
              Site
            </th>
            <th scope="col" className="n">
              Total £
            </th>
          </tr>
        </thead>
        <tbody>
          {drafts.map((draft) => (
            <tr key={draft.id} data-chosen={chosenIds.includes(draft.id) ? "" : undefined}>
              <td className="gcell">
                {onChoose && (
                  <input
                    type="checkbox"
                    checked={chosenIds.includes(draft.id)}
                    onChange={() => toggle(draft.id)}
                    aria-label={`Choose the draft for ${draft.patientName}`}
                  />
                )}
              </td>
              <th scope="row">
                <Link href={`/billing/invoices/${draft.id}`}>{draft.patientName}</Link>
              </th>
              <td data-label="Payer">{draft.payerName ?? "patient"}</td>
              <td data-label="For">{contents(draft)}</td>
              <td className="num" data-label="Days">
                {days(draft, today)}
              </td>
              <td className="soft wide">{draft.siteName}</td>
              <td className="n owedcol" data-label="Total £">
                {figure(draft.totalPence)}
              </td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <td className="gcell" />
            <th scope="row" colSpan={4}>
              All {drafts.length} drafts
            </th>
            <td className="wide" />
            <td className="n owedcol" data-label="Total £">
              {figure(totalPence)}
            </td>
          </tr>
        </tfoot>
      </table>
    </div>
  );
}
