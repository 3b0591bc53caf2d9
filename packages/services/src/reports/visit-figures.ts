import type { FigureKey } from "@withy/contracts/reports";
import { type AppointmentState, appointmentStates, stateFacts } from "@withy/diary/appointment-states";

const holding = appointmentStates.filter((state) => stateFacts[state].holdsTime);

/** The states whose visits each figure counts: the one table for the figures and for the rows behind them. */
export const visitStates = {
  booked: holding,
  delivered: ["fulfilled"],
  attended: ["fulfilled"],
  "did-not-attend": ["noshow"],
  due: ["fulfilled", "noshow"],
  cancelled: ["cancelled"],
  "all-visits": appointmentStates,
} as const satisfies Partial<Record<FigureKey, readonly AppointmentState[]>>;

export type VisitFigure = keyof typeof visitStates;

export function isVisitFigure(key: FigureKey): key is VisitFigure {
  return key in visitStates;
}

export function counts(figure: VisitFigure, state: AppointmentState): boolean {
  return (visitStates[figure] as readonly AppointmentState[]).includes(state);
}
