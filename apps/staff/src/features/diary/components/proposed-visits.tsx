"use client";
import type { CourseProposal, ProposedVisit } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { AlertLine } from "@withy/ui/alert-line";
import { Select } from "@withy/ui/select";
import type { Chosen } from "../course-wish";

export interface ProposedVisitsProps {
  proposal: CourseProposal;
  chosen: Chosen;
  onChoose: (chosen: Chosen) => void;
  errorOf: (id: string) => string | undefined;
  isLooking: boolean;
}

/** Every visit of a course with its day: free, or why not and what to take instead. */
export function ProposedVisits({ proposal, chosen, onChoose, errorOf, isLooking }: ProposedVisitsProps) {
  const { limit, refusal } = proposal;
  const choose = (visit: ProposedVisit, startsAt: string) => {
    const { [visit.position]: _, ...rest } = chosen;
    const free = visit.alternatives.find((one) => one.startsAt === startsAt);
    onChoose(free ? { ...rest, [visit.position]: free } : rest);
  };
  return (
    <div aria-busy={isLooking}>
      {refusal && <AlertLine tone="danger">{refusal}</AlertLine>}
      {limit && !refusal && (
        <p className="small soft">
          {limit.payerName} has authorised {limit.authorised}, {limit.used} used or booked, {limit.left} left.
        </p>
      )}
      <ol className="coursevisits">
        {proposal.visits.map((visit) => (
          <Visit
            key={`${visit.position} ${visit.day}`}
            visit={visit}
            startsAt={chosen[visit.position]?.startsAt ?? ""}
            onChoose={(startsAt) => choose(visit, startsAt)}
            error={errorOf(`visit-${visit.position}`)}
          />
        ))}
      </ol>
    </div>
  );
}

interface VisitProps {
  visit: ProposedVisit;
  startsAt: string;
  onChoose: (startsAt: string) => void;
  error: string | undefined;
}

function Visit({ visit, startsAt, onChoose, error }: VisitProps) {
  const isMoved = startsAt !== "";
  return (
    <li data-state={isMoved ? "free" : visit.state}>
      <span className="rank num">{visit.position}</span>
      <div className="in">
        <p className="num">
          {isMoved ? (
            <s>{`${weekdayDate(visit.day)}, ${visit.startTime}`}</s>
          ) : (
            `${weekdayDate(visit.day)}, ${visit.startTime}`
          )}
        </p>
        {visit.state === "free" ? (
          <p className="soft small">Free, in {visit.roomName}</p>
        ) : (
          <>
            <p className="small warn">{visit.why}</p>
            {visit.alternatives.length > 0 ? (
              <Select
                id={`visit-${visit.position}`}
                label={`Visit ${visit.position} instead`}
                placeholder="Choose another time"
                value={startsAt}
                onChange={(event) => onChoose(event.target.value)}
                options={visit.alternatives.map((free) => ({
                  value: free.startsAt,
                  label: `${weekdayDate(free.day)}, ${free.startTime}`,
                }))}
                error={error}
              />
            ) : (
              <p className="small" id={`visit-${visit.position}`} tabIndex={-1}>
                Nothing is free in the two weeks after it. Change the rhythm, the time or the therapist.
              </p>
            )}
          </>
        )}
      </div>
    </li>
  );
}
