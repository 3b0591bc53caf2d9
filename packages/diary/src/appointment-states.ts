/** The states of a visit, as data. Codes follow HL7 FHIR R4 Appointment.status where it has one. */
export const appointmentStates = [
  "booked",
  "confirmed",
  "arrived",
  "in-session",
  "fulfilled",
  "cancelled",
  "noshow",
] as const;
export type AppointmentState = (typeof appointmentStates)[number];

export interface StateFacts {
  /** The word on screen and in letters. */
  readonly word: string;
  /**
   * HL7 FHIR R4 AppointmentStatus. R4 has no code for a visit that the patient confirmed or for one under way:
   * "confirmed" maps to booked and "in-session" to arrived.
   */
  readonly fhir: "booked" | "arrived" | "fulfilled" | "cancelled" | "noshow";
  /** Whether the visit keeps its therapist and room claimed. */
  readonly holdsTime: boolean;
  /** Whether the patient may still come: neither seen, cancelled nor missed. */
  readonly isOpen: boolean;
}

export const stateFacts: Record<AppointmentState, StateFacts> = {
  booked: { word: "Booked", fhir: "booked", holdsTime: true, isOpen: true },
  confirmed: { word: "Confirmed", fhir: "booked", holdsTime: true, isOpen: true },
  arrived: { word: "Arrived", fhir: "arrived", holdsTime: true, isOpen: true },
  "in-session": { word: "In session", fhir: "arrived", holdsTime: true, isOpen: true },
  fulfilled: { word: "Attended", fhir: "fulfilled", holdsTime: true, isOpen: false },
  cancelled: { word: "Cancelled", fhir: "cancelled", holdsTime: false, isOpen: false },
  noshow: { word: "Did not attend", fhir: "noshow", holdsTime: true, isOpen: false },
};

export interface StateMove {
  readonly from: AppointmentState;
  readonly to: AppointmentState;
  /** Whether the reverse move may take it back while nothing depends on it. */
  readonly canUndo: boolean;
}

/** Every move that goes forward. Going back is the reverse of one of these, never a move of its own. */
export const stateMoves: readonly StateMove[] = [
  { from: "booked", to: "confirmed", canUndo: true },
  { from: "booked", to: "arrived", canUndo: true },
  { from: "booked", to: "cancelled", canUndo: true },
  { from: "booked", to: "noshow", canUndo: true },
  { from: "confirmed", to: "arrived", canUndo: true },
  { from: "confirmed", to: "cancelled", canUndo: true },
  { from: "confirmed", to: "noshow", canUndo: true },
  { from: "arrived", to: "in-session", canUndo: true },
  { from: "arrived", to: "fulfilled", canUndo: true },
  { from: "arrived", to: "cancelled", canUndo: true },
  { from: "in-session", to: "fulfilled", canUndo: true },
  { from: "noshow", to: "arrived", canUndo: true },
];

const forward = new Set(stateMoves.map((m) => `${m.from}>${m.to}`));
const backward = new Set(stateMoves.filter((m) => m.canUndo).map((m) => `${m.to}>${m.from}`));

/** Whether a visit in state `from` may be moved on to state `to`. */
export function canMove(from: AppointmentState, to: AppointmentState): boolean {
  return forward.has(`${from}>${to}`);
}

/** Whether `to` is the state that a visit now in `from` may be put back to, having come from there. */
export function canUndo(from: AppointmentState, to: AppointmentState): boolean {
  return backward.has(`${from}>${to}`);
}

/** The states that a visit may be moved on to, in the order of the table. */
export function nextStates(from: AppointmentState): AppointmentState[] {
  return stateMoves.filter((m) => m.from === from).map((m) => m.to);
}

/** States that keep a therapist and a room claimed. */
export const holdingStates: readonly AppointmentState[] = appointmentStates.filter(
  (s) => stateFacts[s].holdsTime,
);

export function isAppointmentState(text: string): text is AppointmentState {
  return (appointmentStates as readonly string[]).includes(text);
}
