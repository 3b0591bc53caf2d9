"use client";
import type { OfferRoundView } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { offerWords, roundWords } from "@withy/diary/waiting-words";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useRounds, useWaitingMutation } from "../hooks/use-waiting";
import { phoneWords } from "../phone-words";
import { stopRound } from "../waiting-client";

interface Props {
  first: readonly OfferRoundView[];
  mayStop: boolean;
  zone: string;
}

const whenOf = (round: OfferRoundView): string => `${weekdayDate(round.day)}, ${round.startTime}`;

/** What is on offer, with each person's state as it changes; then what became of it lately. */
export function OfferRounds({ first, mayStop, zone }: Props) {
  const rounds = useRounds(first).data;
  const open = rounds.filter((round) => round.state === "open").length;
  return (
    <section aria-labelledby="on-offer">
      <SectionHead id="on-offer" title="On offer" aside={open > 0 ? `${open} now` : undefined} />
      {rounds.length === 0 && (
        <p className="soft small">Nothing is on offer. Offer a time that has come free, or a gap on Today.</p>
      )}
      <div aria-live="polite">
        {rounds.map((round) => (
          <Round key={round.id} round={round} mayStop={mayStop} zone={zone} />
        ))}
      </div>
    </section>
  );
}

function Round({ round, mayStop, zone }: { round: OfferRoundView; mayStop: boolean; zone: string }) {
  return (
    <article className="round" id={`round-${round.id}`} aria-label={`Offer of ${whenOf(round)}`}>
      <div className="roundhead">
        <h3 className="num">{whenOf(round)}</h3>
        <span className="grow small soft">
          {round.therapistName}, {round.site.name}
        </span>
        <RoundState round={round} />
      </div>
      <ol>
        {round.offers.map((offer) => (
          <li key={offer.id} data-state={offer.state}>
            <span className="num soft">{offer.rank}</span>
            <Link href={`/patients/${offer.patientId}`}>{offer.patientName}</Link>
            <span className="small soft num">{offer.phone ? phoneWords(offer.phone) : "no phone"}</span>
            <span className="small">
              {offerWords[offer.state]}
              {offer.decidedTime && ` ${offer.decidedTime}`}
              {offer.state === "open" && offer.message === "failed" && (
                <span className="danger">, e-mail not sent: ring them</span>
              )}
            </span>
          </li>
        ))}
      </ol>
      {mayStop && round.state === "open" && <Stop round={round} zone={zone} />}
    </article>
  );
}

function RoundState({ round }: { round: OfferRoundView }) {
  if (round.state === "open") return <span className="small num">until {round.expiresTime}</span>;
  const words = roundWords[round.state];
  if (round.appointmentId === null) return <span className="small soft">{words}</span>;
  return (
    <Link
      className="small"
      href={`/diary?${new URLSearchParams({ day: round.day, site: round.site.id, at: round.appointmentId })}`}
    >
      {words}: open the visit
    </Link>
  );
}

/** Asked twice, since everyone who has not answered is told at once that the time has gone. */
function Stop({ round, zone }: { round: OfferRoundView; zone: string }) {
  const [isAsked, setIsAsked] = useState(false);
  const stop = useWaitingMutation(stopRound, () => `Offer of ${whenOf(round)} stopped`, zone);
  return (
    <div className="roundstop">
      {stop.error && (
        <AlertLine tone="danger" live>
          {problemItems(stop.error)[0]?.message}
        </AlertLine>
      )}
      {isAsked ? (
        <>
          <Button
            kind="stop"
            size="small"
            busy={stop.isPending}
            onClick={() => stop.mutate({ roundId: round.id, version: round.version })}
          >
            Stop and tell them
          </Button>
          <Button size="small" onClick={() => setIsAsked(false)}>
            Leave it open
          </Button>
        </>
      ) : (
        <Button
          size="small"
          onClick={() => setIsAsked(true)}
          aria-label={`Stop the offer of ${whenOf(round)}`}
        >
          Stop the offer
        </Button>
      )}
    </div>
  );
}
