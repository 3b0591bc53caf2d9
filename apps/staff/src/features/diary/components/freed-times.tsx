"use client";
import type { FreedTimeRow } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { ButtonLink } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { useFreedTimes } from "../hooks/use-waiting";
import { offerHref } from "../waiting-address";

/** Times that a cancelled or moved visit gave back, soonest first, each with the way to offer it. */
export function FreedTimes({ first, mayOffer }: { first: readonly FreedTimeRow[]; mayOffer: boolean }) {
  const times = useFreedTimes(first).data;
  return (
    <section aria-labelledby="freed">
      <SectionHead id="freed" title="Come free" aside={times.length > 0 ? `${times.length}` : undefined} />
      {times.length === 0 && (
        <p className="soft small">
          Nothing came free lately. Gaps of today are on <Link href="/today">Today</Link>.
        </p>
      )}
      <ul className="freedlist">
        {times.map((time) => (
          <li key={`${time.therapistId} ${time.startsAt}`}>
            <span className="num nowrap">
              {weekdayDate(time.day)}, {time.startTime}
            </span>
            <span className="grow">
              <b>{time.therapistName}</b>
              <span className="waitunder">
                {time.minutes} minutes, {time.siteName}, {time.how === "moved" ? "moved away" : "cancelled"}
              </span>
            </span>
            {mayOffer && (
              <ButtonLink
                size="small"
                as={Link}
                href={offerHref({ ...time, freedById: time.appointmentId })}
                aria-label={`Offer ${weekdayDate(time.day)}, ${time.startTime} with ${time.therapistName}`}
              >
                Offer
              </ButtonLink>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
