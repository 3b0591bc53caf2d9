"use client";
import { sessionTime } from "@withy/clinical/programmes/compute-time";
import { sessionEquation } from "@withy/clinical/programmes/equation";
import type { Programme } from "@withy/clinical/programmes/programme";
import { programmeWeek } from "@withy/clinical/programmes/week";
import { clockDuration } from "@withy/core/date-words";
import { Glyph } from "@withy/ui/glyph";
import { changeAll } from "../draft-changes";
import { NumberBox } from "./number-box";

interface EquationProps {
  programme: Programme;
  age: number;
  canWrite: boolean;
  onChange: (update: (programme: Programme) => Programme) => void;
}

/** "10 items × 2 rounds × 30 s work + 30 s rest = 20:00": the clock adds up while the programme is built. */
export function EquationLine(props: EquationProps) {
  const seconds = sessionTime(props.programme).elapsedSeconds;
  return (
    <section className="equation" aria-label="Time of the session">
      <div className="gut note">starts at</div>
      <div className="in">
        {props.programme.mode === "timed" ? <TimedParts {...props} /> : <SetParts {...props} />}
        <i aria-hidden="true">=</i>
        <output className="total num" aria-live="polite" aria-label="Session time">
          {clockDuration(seconds)}
        </output>
        <Week {...props} />
      </div>
    </section>
  );
}

function TimedParts({ programme, canWrite, onChange }: EquationProps) {
  const { timedItems, rounds, workSeconds, restSeconds, restBetweenRoundsSeconds, lastRestDropped } =
    sessionEquation(programme);
  const extra = [
    ...(restBetweenRoundsSeconds > 0 ? [`+ ${restBetweenRoundsSeconds} s between rounds`] : []),
    ...(lastRestDropped ? ["without the last rest"] : []),
  ];
  return (
    <>
      <span className="num">
        <b>{timedItems}</b> {timedItems === 1 ? "item" : "items"}
      </span>
      <i aria-hidden="true">×</i>
      <span className="num">
        <NumberBox
          label="Rounds"
          value={rounds}
          disabled={!canWrite}
          onChange={(value) => onChange((p) => ({ ...p, rounds: value }))}
        />{" "}
        {rounds === 1 ? "round" : "rounds"}
      </span>
      <i aria-hidden="true">×</i>
      <span className="num">
        <NumberBox
          label="Seconds of work, every line"
          value={workSeconds}
          disabled={!canWrite || programme.items.length === 0}
          onChange={(value) => onChange((p) => changeAll(p, { workSeconds: value }))}
        />{" "}
        s work +{" "}
        <NumberBox
          label="Seconds of rest, every line"
          value={restSeconds}
          disabled={!canWrite || programme.items.length === 0}
          onChange={(value) => onChange((p) => changeAll(p, { restSeconds: value }))}
        />{" "}
        s rest
        {extra.length > 0 && <span className="extra">{extra.join(", ")}</span>}
      </span>
    </>
  );
}

function SetParts({ programme }: EquationProps) {
  const { underTensionSeconds } = sessionTime(programme);
  const count = programme.items.length;
  return (
    <span className="num">
      <b>{count}</b> {count === 1 ? "exercise" : "exercises"}, <b>{clockDuration(underTensionSeconds)}</b> of
      work, with rests
    </span>
  );
}

const weekWords = (seconds: number) => {
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  const rest = minutes % 60;
  const hours = Math.floor(minutes / 60);
  return `${hours} ${hours === 1 ? "hour" : "hours"}${rest === 0 ? "" : ` ${rest} min`}`;
};

function Week({ programme, age, canWrite, onChange }: EquationProps) {
  const week = programmeWeek(programme, age);
  const strength = week.guidance.find((line) => line.aim === "strength");
  return (
    <span className="week">
      <NumberBox
        label="Sessions a week"
        className="number-box small"
        value={programme.sessionsPerWeek}
        disabled={!canWrite}
        onChange={(value) => onChange((p) => ({ ...p, sessionsPerWeek: value }))}
      />{" "}
      {programme.sessionsPerWeek === 1 ? "session" : "sessions"} a week, {weekWords(week.weekSeconds)}.
      {strength && (
        <span className="soft">
          Guidance asks for {strength.asks} {strength.isMet ? <Glyph name="tick" /> : "(not yet)"}
        </span>
      )}
    </span>
  );
}
