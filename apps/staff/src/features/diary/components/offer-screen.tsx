"use client";
import type { OfferMatch, OfferMatchesView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { Button, ButtonLink } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { EmptyState } from "@withy/ui/empty-state";
import { ErrorSummary } from "@withy/ui/error-summary";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { useWaitingMutation } from "../hooks/use-waiting";
import { phoneWords } from "../phone-words";
import { addHref } from "../waiting-address";
import { type OfferTime, offerTime } from "../waiting-client";

export interface OfferScreenProps {
  view: OfferMatchesView;
  freedById: string | null;
  zone: string;
}

const bestOf = (view: OfferMatchesView): string[] =>
  view.matches
    .filter((match) => match.canReceive)
    .slice(0, view.offerCount)
    .map((match) => match.entryId);

const toPeople = (count: number): string => (count === 1 ? "1 person" : `${count} people`);

/** Whom a time that came free suits, best first; ticked are those who would be asked. */
export function OfferScreen({ view, freedById, zone }: OfferScreenProps) {
  const router = useRouter();
  const isAwake = useAwake();
  const [chosen, setChosen] = useState<readonly string[]>(() => bestOf(view));
  const [minutesText, setMinutesText] = useState(String(view.offerMinutes));
  const [key] = useState(() => crypto.randomUUID());
  const offer = useWaitingMutation(
    (input: OfferTime) => offerTime(input, key),
    (_, input) =>
      `${view.startTime} with ${view.therapistName} offered to ${toPeople(input.entryIds.length)}`,
    zone,
  );
  const minutes = Number(minutesText.trim());
  const isSound = Number.isInteger(minutes) && minutes >= 5 && minutes <= 2880;
  const timeProblem = "Enter whole minutes from 5 to 2880 (two days)";
  const [isEmpty, setIsEmpty] = useState(false);
  const nobody = [{ id: "matches", message: "Choose at least one person" }];
  const errors =
    isEmpty && chosen.length === 0
      ? nobody
      : offer.error
        ? problemItems(offer.error, (field) => `offer-${field}`)
        : [];
  const inOrder = view.matches.map((match) => match.entryId).filter((id) => chosen.includes(id));
  const submit = () => {
    setIsEmpty(inOrder.length === 0);
    if (!isSound || inOrder.length === 0) return;
    const { siteId, therapistId, startsAt } = view;
    const input = { siteId, therapistId, startsAt, minutes, freedById, entryIds: inOrder };
    offer.mutate(input, { onSuccess: () => router.push("/diary/waiting") });
  };
  const toggle = (id: string) =>
    setChosen(chosen.includes(id) ? chosen.filter((one) => one !== id) : [...chosen, id]);
  return (
    <Page>
      <PageTitle
        title={`Offer ${titleDate(view.day)}, ${view.startTime}`}
        lead={`${view.therapistName}, ${view.siteName}, ${view.freeMinutes} minutes free until ${view.freeUntilTime}.`}
      />
      <PageBody>
        <form
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            submit();
          }}
        >
          <ErrorSummary errors={errors} attempt={offer.submittedAt} title="Nothing was offered yet" />
          <Matches view={view} chosen={chosen} onToggle={toggle} />
          {view.matches.length > 0 && (
            <div className="offerfoot">
              <TextInput
                id="offer-minutes"
                label="Minutes to answer"
                inputMode="numeric"
                span="short"
                value={minutesText}
                onChange={(event) => setMinutesText(event.target.value)}
                error={isSound ? undefined : timeProblem}
              />
              <Button kind="primary" type="submit" busy={offer.isPending} disabled={!isAwake}>
                Offer to {toPeople(inOrder.length)}
              </Button>
            </div>
          )}
        </form>
        <NotFit view={view} />
      </PageBody>
    </Page>
  );
}

interface MatchesProps {
  view: OfferMatchesView;
  chosen: readonly string[];
  onToggle: (id: string) => void;
}

function Matches({ view, chosen, onToggle }: MatchesProps) {
  const { matches } = view;
  if (matches.length === 0)
    return (
      <EmptyState
        title="It suits nobody who waits."
        action={
          <ButtonLink as={Link} size="small" href={addHref({ patientId: null })}>
            Add someone to the list
          </ButtonLink>
        }
      >
        Below stands why not. Book someone else into it from Find a time.
      </EmptyState>
    );
  return (
    <section aria-labelledby="matches">
      <SectionHead id="matches" title={`It suits ${toPeople(matches.length)}`} aside="best first" />
      <ol className="matches">
        {matches.map((match, i) => (
          <Match
            key={match.entryId}
            match={match}
            rank={i + 1}
            isChosen={chosen.includes(match.entryId)}
            onToggle={() => onToggle(match.entryId)}
          />
        ))}
      </ol>
    </section>
  );
}

interface MatchProps {
  match: OfferMatch;
  rank: number;
  isChosen: boolean;
  onToggle: () => void;
}

function Match({ match, rank, isChosen, onToggle }: MatchProps) {
  return (
    <li>
      <span className="rank num">{rank}</span>
      <div>
        <Check checked={isChosen} onChange={onToggle} disabled={!match.canReceive}>
          <b>{match.patientName}</b>, {match.serviceName}, {match.durationMinutes} minutes
        </Check>
        <p className="small">{match.reasons.join(". ")}.</p>
        {match.deskNote && <p className="small serif">{match.deskNote}</p>}
        {match.caveat && (
          <p className="small warn">
            {match.caveat} {match.phone && <span className="num">{phoneWords(match.phone)}</span>}
          </p>
        )}
      </div>
    </li>
  );
}

function NotFit({ view }: { view: OfferMatchesView }) {
  if (view.others.length === 0) return null;
  return (
    <section aria-labelledby="notfit">
      <SectionHead id="notfit" title="Why not the others" aside={`${view.others.length}`} />
      <ul className="notfit">
        {view.others.map((one) => (
          <li key={one.entryId}>
            <span>{one.patientName}</span>
            <span className="soft">{one.whyNot}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
