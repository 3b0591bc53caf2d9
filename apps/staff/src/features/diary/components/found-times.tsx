"use client";
import type { FoundTimesView, FoundTimeView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import type { WishKind } from "@withy/diary/time-wishes";
import { Button, ButtonLink, Buttons } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";

export interface FoundTimesProps {
  found: FoundTimesView;
  isLooking: boolean;
  chosen: number;
  onChoose: (index: number) => void;
  onBook: (time: FoundTimeView) => void;
  onRelax: (wish: WishKind) => void;
  /** Where the caller is put on the waiting list with what is known. */
  waitHref: string;
}

/** The times, best first, each with what speaks for and against it. */
export function FoundTimes({
  found,
  isLooking,
  chosen,
  onChoose,
  onBook,
  onRelax,
  waitHref,
}: FoundTimesProps) {
  const { times, none } = found;
  return (
    <section className="ranked" aria-labelledby="found" aria-busy={isLooking}>
      <SectionHead
        id="found"
        title={times.length === 1 ? "1 time" : `${times.length} times`}
        aside={`best first, of ${found.lookedAt} looked at in ${Math.max(1, Math.round(found.tookMs))} ms`}
      />
      {times.length > 0 && (
        <div className="markhead small soft" aria-hidden="true">
          <span />
          <span>wish</span>
          <span>wait</span>
          <span>knows</span>
          <span>day</span>
          <span />
        </div>
      )}
      <ol>
        {times.map((time, i) => (
          <FoundTime
            key={`${time.therapist.id} ${time.site.id} ${time.startsAt}`}
            time={time}
            rank={i + 1}
            isChosen={i === chosen}
            onChoose={() => onChoose(i)}
            onBook={() => onBook(time)}
          />
        ))}
      </ol>
      {none && <WhyNone none={none} isEmpty={times.length === 0} onRelax={onRelax} waitHref={waitHref} />}
    </section>
  );
}

interface FoundTimeProps {
  time: FoundTimeView;
  rank: number;
  isChosen: boolean;
  onChoose: () => void;
  onBook: () => void;
}

const sentence = (phrases: readonly string[]) => (phrases.length === 0 ? "" : `${phrases.join(". ")}.`);

function FoundTime({ time, rank, isChosen, onChoose, onBook }: FoundTimeProps) {
  return (
    <li data-chosen={isChosen ? "" : undefined} onFocus={onChoose} onMouseEnter={onChoose}>
      <span className="rank num">{rank}</span>
      <div className="in">
        <h3>
          {titleDate(time.day)}, <span className="num">{time.startTime}</span>
        </h3>
        <p className="where soft small num">
          to {time.endTime}, {time.therapist.name}, {time.room.name}, {time.site.name}
        </p>
        <p className="why">
          {sentence(time.reasons)}{" "}
          {time.drawbacks.length > 0 && <span className="warn">{sentence(time.drawbacks)}</span>}
        </p>
        <div className="marks">
          <Bars label="Wish" mark={time.marks.wish} />
          <Bars label="Wait" mark={time.marks.wait} />
          <Bars label="Knows" mark={time.marks.knows} />
          <Bars label="Day" mark={time.marks.day} />
        </div>
        <div className="go">
          <Button
            size="small"
            kind={isChosen ? "primary" : "quiet"}
            shortcut={isChosen ? "B" : undefined}
            aria-label={`Book ${titleDate(time.day)}, ${time.startTime} with ${time.therapist.name}`}
            onClick={onBook}
          >
            Book
          </Button>
        </div>
      </div>
    </li>
  );
}

function Bars({ label, mark }: { label: string; mark: number | null }) {
  const says = mark === null ? `${label}: does not apply` : `${label}: ${mark} of 5`;
  return (
    <span className="bars" role="img" aria-label={says}>
      {[1, 2, 3, 4, 5].map((n) => (
        <i key={n} data-on={mark !== null && n <= mark ? "" : undefined} />
      ))}
    </span>
  );
}

interface WhyNoneProps {
  none: NonNullable<FoundTimesView["none"]>;
  isEmpty: boolean;
  onRelax: (wish: WishKind) => void;
  waitHref: string;
}

function WhyNone({ none, isEmpty, onRelax, waitHref }: WhyNoneProps) {
  const { relax } = none;
  const action = (
    <Buttons>
      {relax && (
        <Button size="small" onClick={() => onRelax(relax.wish)}>
          Look without that wish
        </Button>
      )}
      <ButtonLink size="small" as={Link} href={waitHref}>
        Put on the waiting list
      </ButtonLink>
    </Buttons>
  );
  if (isEmpty) {
    return (
      <EmptyState title={none.message} action={action}>
        {relax?.message}
      </EmptyState>
    );
  }
  return (
    <div className="whynot">
      <p className="soft">No time meets every wish</p>
      <p>
        {none.message} {relax?.message}
      </p>
      {action}
    </div>
  );
}
