"use client";
import type { AppointmentView } from "@withy/contracts/diary";
import { timeOf } from "@withy/core/wall-clock";
import type { AppointmentState } from "@withy/diary/appointment-states";
import { stateFacts } from "@withy/diary/appointment-states";
import { Button } from "@withy/ui/button";
import { Key } from "@withy/ui/key";
import { StateMark } from "@withy/ui/state-mark";
import { AppointmentStateMark, appointmentStateLook } from "@/components/appointment-state-mark";

export interface SheetVerbs {
  canBook: boolean;
  canMark: boolean;
  canCancel: boolean;
  isBusy: boolean;
  onMark: (to: Mark) => void;
  onCancel: () => void;
  onUndo: () => void;
}

export type Mark = "confirmed" | "arrived" | "in-session" | "fulfilled" | "noshow";

const keys: Partial<Record<AppointmentState, string>> = {
  arrived: "A",
  "in-session": "S",
  fulfilled: "F",
  noshow: "N",
  cancelled: "X",
};

function happened(view: AppointmentView): string | null {
  const at = { arrived: view.arrivedAt, "in-session": view.sessionStartedAt, fulfilled: view.sessionEndedAt }[
    view.state as "arrived" | "in-session" | "fulfilled"
  ];
  return at ? timeOf(new Date(at), view.site.zone) : null;
}

/** The state as it is, and every move from it on a line of its own with its key. */
export function SheetStates({ view, verbs }: { view: AppointmentView; verbs: SheetVerbs }) {
  const moves = view.next.filter((to) => (to === "cancelled" ? verbs.canCancel : verbs.canMark));
  return (
    <div className="part">
      <div className="r">
        <span>{happened(view)}</span>
        <div className="statenow timeblock" data-edge={appointmentStateLook(view.state).edge}>
          <AppointmentStateMark code={view.state} bare />
        </div>
      </div>
      {moves.map((to) => (
        <div className="r" key={to}>
          <span />
          <button
            type="button"
            className="ln stateverb"
            disabled={verbs.isBusy}
            onClick={() => (to === "cancelled" ? verbs.onCancel() : verbs.onMark(to as Mark))}
          >
            {to === "cancelled" ? (
              <StateMark code={to} label="Cancel, and say why" edge="struck" bare />
            ) : (
              <AppointmentStateMark code={to} bare />
            )}
            {keys[to] && <Key>{keys[to]}</Key>}
          </button>
        </div>
      ))}
      {view.undoTo && verbs.canMark && (
        <div className="r">
          <span />
          <div>
            <Button kind="plain" size="small" busy={verbs.isBusy} onClick={verbs.onUndo}>
              Undo, back to {stateFacts[view.undoTo].word.toLowerCase()}
            </Button>
          </div>
        </div>
      )}
    </div>
  );
}
