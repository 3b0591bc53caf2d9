import type { TodayGap, TodayOwed, TodayView } from "@withy/contracts/diary";
import { sumPence } from "@withy/core/money";
import { Money } from "@withy/ui/money";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";

function lengthWords(minutes: number): string {
  const hours = Math.floor(minutes / 60);
  const rest = Math.round(minutes % 60);
  if (hours === 0) return `${rest} min`;
  return rest === 0 ? `${hours} h` : `${hours} h ${rest}`;
}

function end(gap: TodayGap): string {
  const [h = 0, m = 0] = gap.startTime.split(":").map(Number);
  const minute = h * 60 + m + gap.minutes;
  return `${Math.floor(minute / 60)
    .toString()
    .padStart(2, "0")}:${(minute % 60).toString().padStart(2, "0")}`;
}

function bookHref(gap: TodayGap, day: string): string {
  const wishes = {
    therapist: gap.therapistId,
    site: gap.siteId,
    on: day,
    from: gap.startTime,
    until: end(gap),
  };
  return `/diary/find?${new URLSearchParams(wishes)}`;
}

/** To whoever waits and would come then. */
function offerHref({ siteId, therapistId, startsAt }: TodayGap): string {
  return `/diary/waiting/offer?${new URLSearchParams({ site: siteId, therapist: therapistId, at: startsAt })}`;
}

/** Beside the arrivals: time that can still be sold, and money that can still be taken. */
export function TodaySide({ view, canBook }: { view: TodayView; canBook: boolean }) {
  return (
    <div className="todayside">
      <section aria-labelledby="gaps">
        <SectionHead
          title="Gaps to fill"
          id="gaps"
          aside={view.gapMinutes > 0 ? `${lengthWords(view.gapMinutes)} today` : undefined}
          action={
            <Link className="small" href="/diary/waiting">
              Waiting list
            </Link>
          }
        />
        {view.gaps.length === 0 && <p className="soft small todaylast">No gap long enough for a visit.</p>}
        <ul>
          {view.gaps.map((gap) => (
            <li className="it" key={`${gap.therapistId} ${gap.siteId} ${gap.startTime}`}>
              <span className="num soft">{gap.startTime}</span>
              <div>
                <b>{gap.therapistName}</b>
                <span className="small soft">
                  {lengthWords(gap.minutes)}, until {end(gap)}
                  {view.sites.length > 1 && `, ${view.sites.find((site) => site.id === gap.siteId)?.name}`}
                </span>
              </div>
              {canBook && (
                <span className="small ac">
                  <Link href={offerHref(gap)} aria-label={`Offer ${gap.therapistName} at ${gap.startTime}`}>
                    Offer
                  </Link>{" "}
                  <Link
                    href={bookHref(gap, view.day)}
                    aria-label={`Book ${gap.therapistName} at ${gap.startTime}`}
                  >
                    Book
                  </Link>
                </span>
              )}
            </li>
          ))}
        </ul>
      </section>
      {view.toCollect && <ToCollect owed={view.toCollect} />}
    </div>
  );
}

function ToCollect({ owed }: { owed: readonly TodayOwed[] }) {
  const total = sumPence(owed.map((one) => one.owesPence));
  return (
    <section aria-labelledby="collect">
      <SectionHead
        title="To collect"
        id="collect"
        aside={owed.length > 0 ? <Money pence={total} /> : undefined}
      />
      {owed.length === 0 && <p className="soft small todaylast">No one who comes today owes anything.</p>}
      <ul>
        {owed.map((one) => (
          <li className="it" key={one.invoiceId}>
            <span className="num soft">
              <Money pence={one.owesPence} />
            </span>
            <div>
              <b>{one.patientName}</b>
              <span className="small soft num">
                {one.reference}, here {one.startTime}
              </span>
            </div>
            <span className="small ac">
              <Link
                href={`/billing/invoices/${one.invoiceId}`}
                aria-label={`Open ${one.reference} of ${one.patientName}`}
              >
                Open
              </Link>
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
