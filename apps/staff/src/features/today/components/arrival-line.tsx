import type { TodayArrival } from "@withy/contracts/diary";
import { shortDate } from "@withy/core/date-words";
import { stateFacts } from "@withy/diary/appointment-states";
import { Glyph } from "@withy/ui/glyph";
import { Key } from "@withy/ui/key";
import { Line } from "@withy/ui/line";
import { Money } from "@withy/ui/money";
import { Edge } from "@withy/ui/state-mark";
import Link from "next/link";
import { AppointmentStateMark, appointmentStateLook } from "@/components/appointment-state-mark";

export interface ArrivalLineProps {
  arrival: TodayArrival;
  /** The time is written once for all that start then. */
  showsTime: boolean;
  isChosen: boolean;
  onChoose: () => void;
  onMark: (() => void) | undefined;
}

const keyOf = { arrived: "A", "in-session": "S", fulfilled: "F" } as const;
const longWait = 10;

/** One visit of the day: who, for what, with whom, what to know, and the key of the next step. */
export function ArrivalLine({ arrival: a, showsTime, isChosen, onChoose, onMark }: ArrivalLineProps) {
  return (
    <Line
      gutter={showsTime ? a.startTime : <span className="vh">{a.startTime}</span>}
      tick
      chosen={isChosen}
      className="arrival"
    >
      <Edge edge={appointmentStateLook(a.state).edge} />
      <AppointmentStateMark code={a.state} bare />
      <Link
        className="who"
        href={`/diary?at=${a.appointmentId}`}
        tabIndex={isChosen ? 0 : -1}
        data-line={isChosen ? "chosen" : ""}
        onFocus={onChoose}
      >
        {a.patientName}
      </Link>
      <span className="soft num small born">{shortDate(a.bornOn)}</span>
      <span className="what">{a.serviceName}</span>
      <span className="soft where">
        {a.therapistName.split(" ")[0]}, {a.roomName}
      </span>
      <span className="small remark">
        <Remark arrival={a} />
      </span>
      {a.nextMark && onMark ? (
        <button
          type="button"
          className="mark-next"
          tabIndex={isChosen ? 0 : -1}
          aria-label={`${stateFacts[a.nextMark].word}: ${a.patientName}`}
          onClick={onMark}
          onFocus={onChoose}
        >
          <Key>{keyOf[a.nextMark]}</Key>
        </button>
      ) : (
        <span />
      )}
    </Line>
  );
}

function Remark({ arrival: a }: { arrival: TodayArrival }) {
  const waits = a.waitingMinutes !== null && a.waitingMinutes >= longWait;
  if (waits) {
    return (
      <>
        <span className="warn">
          <Glyph name="warn" />
        </span>{" "}
        Waiting {a.waitingMinutes} min, tell {a.therapistName.split(" ")[0]}
      </>
    );
  }
  if (a.remark) return a.remark;
  if (a.owesPence) {
    return (
      <>
        Owes <Money pence={a.owesPence} />
      </>
    );
  }
  return a.waitingMinutes === null ? null : `Waiting ${a.waitingMinutes} min`;
}
