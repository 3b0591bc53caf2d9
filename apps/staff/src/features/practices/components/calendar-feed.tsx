"use client";
import type { CalendarFeedView } from "@withy/contracts/diary";
import { longDate } from "@withy/core/date-words";
import { Button, Buttons } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import { useState } from "react";
import { useAwake } from "@/components/use-awake";
import { useMakeCalendarFeed, useRevokeCalendarFeed } from "../hooks/use-calendar-feed";
import { momentWords } from "../moment-words";
import { SecretOnce } from "./secret-once";

interface Props {
  first: CalendarFeedView | null;
  zone: string;
}

/** One's own visits in one's own calendar program, by a secret address that can be ended. */
export function CalendarFeed({ first, zone }: Props) {
  const [feed, setFeed] = useState(first);
  const [address, setAddress] = useState<string | null>(null);
  const make = useMakeCalendarFeed();
  const revoke = useRevokeCalendarFeed();
  const isAwake = useAwake();
  const problem = make.error ?? revoke.error;
  const begin = () => {
    revoke.reset();
    make.mutate(undefined, {
      onSuccess: (made) => {
        setFeed(made.feed);
        setAddress(`${window.location.origin}${made.path}`);
      },
    });
  };
  const end = () => {
    make.reset();
    revoke.mutate(undefined, {
      onSuccess: () => {
        setFeed(null);
        setAddress(null);
      },
    });
  };
  return (
    <section aria-labelledby="feed-title">
      <SectionHead
        id="feed-title"
        title="Your visits in your calendar"
        aside="30 days back, 180 days ahead"
      />
      {problem && (
        <p className="danger" role="alert">
          {problem.message}
        </p>
      )}
      <p aria-live="polite">{feed ? feedWords(feed, zone) : "No calendar reads your diary."}</p>
      {address !== null && (
        <SecretOnce
          id="feedAddress"
          label="Address for your calendar"
          hint="Shown only now. Add it in your calendar as a subscription by address. Whoever has it can read your diary, so keep it to yourself."
          value={address}
        />
      )}
      <Buttons>
        <Button disabled={!isAwake} busy={make.isPending} onClick={begin}>
          {feed ? "Make a new address" : "Make an address"}
        </Button>
        {feed && (
          <Button kind="stop" disabled={!isAwake} busy={revoke.isPending} onClick={end}>
            End this address
          </Button>
        )}
      </Buttons>
      {feed && <p className="soft">A new address ends the one before it.</p>}
    </section>
  );
}

function feedWords({ createdAt, lastReadOn }: CalendarFeedView, zone: string): string {
  const read =
    lastReadOn === null ? "No calendar has asked for it yet" : `Last read on ${longDate(lastReadOn)}`;
  return `An address was made on ${momentWords(createdAt, zone)}. ${read}.`;
}
