"use client";
import type { CoverMoveView, CoverPlanView } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import Link from "next/link";
import { counted, placeWords, totalsOf } from "../cover-words";

interface CoverMovesProps {
  plan: CoverPlanView;
  busy: boolean;
  /** Null once the plan is closed: then the table only tells. */
  onChange: ((move: CoverMoveView) => void) | null;
  onTell: (move: CoverMoveView, decision: "keep" | "phone") => void;
}

const tellWords: Record<CoverMoveView["tells"], string> = {
  message: "is told by e-mail",
  ring: "to ring",
  nobody: "notices nothing",
};

/** Every visit of the plan: where it was, where it goes, what that costs, and how its patient hears of it. */
export function CoverMoves({ plan, busy, onChange, onTell }: CoverMovesProps) {
  const totals = totalsOf(plan.moves);
  const { outcome } = plan;
  return (
    <section className="covermoves" aria-labelledby="moves-title">
      <div className="body">
        <h2 id="moves-title" className="vh">
          The visits
        </h2>
        <p className="num">
          {counted(totals.moving.length, "visit")} of {plan.moves.length} with a new place,{" "}
          {counted(totals.told, "patient")} to write to, {totals.ring.length} to ring. Together{" "}
          {counted(totals.points, "point")} of change
          {outcome?.isProved && outcome.points === totals.points ? ", and no other plan has fewer" : ""}.
        </p>
        {outcome && outcome.outOfReach > 0 && (
          <AlertLine>
            {counted(outcome.outOfReach, "visit")} at another desk's site stay as they are. Ask that desk to
            plan them.
          </AlertLine>
        )}
        {outcome && outcome.classes > 0 && (
          <AlertLine>
            {counted(outcome.classes, "class").replace("classs", "classes")} in that time stay as they are.
            Move or cancel them by hand.
          </AlertLine>
        )}
      </div>
      <div className="tblw">
        <table className="acc covertable">
          <caption className="vh">Visits of the plan</caption>
          <thead>
            <tr>
              <td className="gcell" />
              <th scope="col">Patient</th>
              <th scope="col">New place</th>
              <th scope="col">Change</th>
              <th scope="col" className="n">
                Points
              </th>
              <th scope="col">Patient hears</th>
              {onChange && (
                <th scope="col">
                  <span className="vh">Decide</span>
                </th>
              )}
            </tr>
          </thead>
          <tbody>
            {plan.moves.map((move) => (
              <CoverMoveRow key={move.id} move={move} busy={busy} onChange={onChange} onTell={onTell} />
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}

function CoverMoveRow({
  move,
  busy,
  onChange,
  onTell,
}: Omit<CoverMovesProps, "plan"> & { move: CoverMoveView }) {
  const { before, place, patient } = move;
  const isPhone = move.decision === "phone";
  return (
    <tr>
      <td className="gcell num">{before.startTime}</td>
      <th scope="row">
        <Link href={`/patients/${patient.id}`}>{patient.name}</Link>
        <span className="soft small"> {move.serviceName}</span>
        <br />
        <span className="soft small num">{placeWords(before, before.site.id)}</span>
      </th>
      <td className="num" data-label="New place">
        {place ? placeWords(place, before.site.id) : <span className="danger">No place: {move.problem}</span>}
      </td>
      <td data-label="Change">{place ? place.reasons.join(", ") : ""}</td>
      <td className="n" data-label="Points">
        {place ? place.cost : ""}
      </td>
      <td data-label="Patient hears">{tellWords[move.tells]}</td>
      {onChange && (
        <td>
          <span className="btns">
            <Button
              size="small"
              disabled={busy}
              aria-label={`Another place for ${patient.name}`}
              onClick={() => onChange(move)}
            >
              Change
            </Button>
            {place && move.tells !== "nobody" && (
              <Button
                size="small"
                disabled={busy}
                aria-label={isPhone ? `Write to ${patient.name}` : `Phone ${patient.name} first`}
                onClick={() => onTell(move, isPhone ? "keep" : "phone")}
              >
                {isPhone ? "Write instead" : "Phone first"}
              </Button>
            )}
          </span>
        </td>
      )}
    </tr>
  );
}
