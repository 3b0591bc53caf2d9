"use client";
import type { CoverMoveView, CoverPlanView, CoverRefusalDetail } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, ButtonLink } from "@withy/ui/button";
import { Page, PageTitle } from "@withy/ui/page";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { ApiError } from "@/api/request";
import { counted, planStateWords, totalsOf } from "../cover-words";
import { useCoverPlan } from "../hooks/use-cover-plan";
import { CoverMoves } from "./cover-moves";
import { CoverRing } from "./cover-ring";
import { CoverUndo } from "./cover-undo";

const CoverPlaceDialog = dynamic(() => import("./cover-place-dialog").then((m) => m.CoverPlaceDialog));

/** "Tue 1 Dec, 08:00 to 20:00. Unwell". */
function whenWords(plan: CoverPlanView): string {
  const end = plan.endDay === plan.startDay ? plan.endTime : `${weekdayDate(plan.endDay)}, ${plan.endTime}`;
  return `${weekdayDate(plan.startDay)}, ${plan.startTime} to ${end}. ${plan.reason}`;
}

/** One plan from the first minute of its making to the last minute in which it can be taken back. */
export function CoverPlan({ first }: { first: CoverPlanView }) {
  const { plan, isUnderWay, decide, apply, undo } = useCoverPlan(first);
  const [changing, setChanging] = useState<CoverMoveView | null>(null);
  const { moving, told } = totalsOf(plan.moves);
  const isReady = plan.state === "ready";
  const failure = apply.error ?? undo.error ?? decide.error;
  const send = (move: CoverMoveView, decision: "keep" | "phone") =>
    decide.mutate({ coverPlanId: plan.id, coverMoveId: move.id, version: plan.version, decision });
  return (
    <Page className="coverpage">
      <PageTitle
        title={`Cover for ${plan.cause.name}`}
        note={isReady || isUnderWay ? undefined : planStateWords[plan.state]}
        lead={whenWords(plan)}
        actions={
          <>
            <ButtonLink as={Link} href="/diary/cover" size="small">
              Another plan
            </ButtonLink>
            {isReady && moving.length > 0 && (
              <Button kind="primary" busy={apply.isPending} onClick={() => apply.mutate()}>
                Move {counted(moving.length, "visit")}
                {told > 0 && ` and tell ${counted(told, "patient")}`}
              </Button>
            )}
          </>
        }
      />
      <div className="body coverstate" aria-live="polite">
        {isUnderWay && <CoverProgress plan={plan} />}
        {plan.job?.problem && <AlertLine tone="danger">{plan.job.problem}</AlertLine>}
        {failure && <CoverRefusal error={failure} />}
        {plan.state === "applied" && (
          <CoverUndo until={plan.undoUntil} busy={undo.isPending} onUndo={() => undo.mutate()} />
        )}
      </div>
      {plan.outcome && (
        <CoverMoves
          plan={plan}
          busy={decide.isPending || apply.isPending}
          onChange={isReady ? setChanging : null}
          onTell={send}
        />
      )}
      <CoverRing plan={plan} />
      {changing && (
        <CoverPlaceDialog
          plan={plan}
          move={changing}
          decide={decide}
          onClose={() => {
            setChanging(null);
            decide.reset();
          }}
        />
      )}
    </Page>
  );
}

function CoverProgress({ plan }: { plan: CoverPlanView }) {
  const { done = 0, total = 0 } = plan.job ?? {};
  if (total === 0) return <p className="soft num">The plan begins in a moment.</p>;
  const isSolving = done >= total - 1;
  return (
    <p className="soft num">
      {isSolving
        ? "Choosing the places that change the least."
        : `Looking for places: ${done} of ${total - 1} visits.`}
    </p>
  );
}

/** What is in the way, and whose visits. */
function CoverRefusal({ error }: { error: unknown }) {
  const more = error instanceof ApiError ? (error.problem.more as Partial<CoverRefusalDetail>) : {};
  return (
    <AlertLine tone="danger" live>
      {problemItems(error)[0]?.message}
      {more.visits && (
        <ul>
          {more.visits.map((v) => (
            <li key={v.appointmentId}>
              {v.patientName}, <span className="num">{v.when}</span>
            </li>
          ))}
        </ul>
      )}
    </AlertLine>
  );
}
