"use client";
import type { DraftingJobView, VisitToInvoiceView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { formatMoney, type Pence } from "@withy/core/money";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Line } from "@withy/ui/line";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { useDrafting } from "../hooks/use-drafting";

interface VisitsToInvoiceProps {
  visits: readonly VisitToInvoiceView[];
  totalPence: Pence;
  areMore: boolean;
  /** What this person started earlier and is not finished yet. */
  drafting: DraftingJobView | null;
  today: string;
  mayDraft: boolean;
}

const mostShown = 40;

/** "Drafting: 240 of 629 visits". */
const draftingWords = ({ progressDone, progressTotal }: DraftingJobView): string =>
  progressTotal === 0 ? "Drafting begins" : `Drafting: ${progressDone} of ${progressTotal} visits`;

/** Attended visits that stand on no invoice, oldest first; one press puts those with a price on drafts. */
export function VisitsToInvoice(props: VisitsToInvoiceProps) {
  const { visits, totalPence, areMore, drafting, today, mayDraft } = props;
  const draft = useDrafting(drafting);
  const unpriced = visits.filter((v) => v.pricePence === null).length;
  const priced = visits.length - unpriced;
  return (
    <section className="tobill" aria-labelledby="visits-title">
      <div className="body">
        <SectionHead
          id="visits-title"
          title="Attended, on no draft yet"
          aside={`${areMore ? "the oldest " : ""}${visits.length} visits, ${formatMoney(totalPence)}`}
          action={
            mayDraft &&
            priced > 0 && (
              <Button busy={draft.isBusy} onClick={() => draft.run(areMore ? null : priced)}>
                Draft {priced} {priced === 1 ? "visit" : "visits"}
              </Button>
            )
          }
        />
        <div aria-live="polite" className="soft small num">
          {draft.progress && draftingWords(draft.progress)}
        </div>
        {draft.problem !== null && <AlertLine tone="danger">{draft.problem}</AlertLine>}
        {unpriced > 0 && (
          <AlertLine>
            {unpriced === 1 ? "One visit has" : `${unpriced} visits have`} no price on the list for their day.
            Add the price, then draft them.
          </AlertLine>
        )}
        {visits.length === 0 && <p className="soft">Every attended visit is on an invoice or a draft.</p>}
      </div>
      {visits.slice(0, mostShown).map((visit) => (
        <Line key={visit.appointmentId} gutter={shortDate(visit.on, today)} tick className="billline">
          <Link href={`/patients/${visit.patientId}`}>{visit.patientName}</Link>
          <span>{visit.serviceName}</span>
          <span className="soft">{visit.payerName ?? "patient"}</span>
          <span className="soft">{visit.siteName}</span>
          <span className="n num">
            {visit.pricePence === null ? "no price" : formatMoney(visit.pricePence)}
          </span>
        </Line>
      ))}
      {visits.length > mostShown && (
        <p className="body soft small num">and {visits.length - mostShown} more; drafting takes them all.</p>
      )}
    </section>
  );
}
