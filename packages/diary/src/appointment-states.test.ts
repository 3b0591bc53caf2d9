import { describe, expect, it } from "vitest";
import {
  type AppointmentState,
  appointmentStates,
  canMove,
  canUndo,
  holdingStates,
  nextStates,
  stateFacts,
  stateMoves,
} from "./appointment-states";

const allowed: Record<AppointmentState, AppointmentState[]> = {
  booked: ["confirmed", "arrived", "cancelled", "noshow"],
  confirmed: ["arrived", "cancelled", "noshow"],
  arrived: ["in-session", "fulfilled", "cancelled"],
  "in-session": ["fulfilled"],
  fulfilled: [],
  cancelled: [],
  noshow: ["arrived"],
};

describe("the moves of a visit", () => {
  it("allows exactly the moves written down, over every pair of states", () => {
    for (const from of appointmentStates)
      for (const to of appointmentStates)
        expect(`${from}>${to} ${canMove(from, to)}`).toBe(`${from}>${to} ${allowed[from].includes(to)}`);
  });

  it("undoes a move only by its exact reverse", () => {
    for (const from of appointmentStates)
      for (const to of appointmentStates) {
        const undoes = stateMoves.some((m) => m.canUndo && m.from === to && m.to === from);
        expect(canUndo(from, to)).toBe(undoes);
      }
  });

  it("reaches every state from booked, and never moves to itself", () => {
    const seen = new Set<AppointmentState>(["booked"]);
    const queue: AppointmentState[] = ["booked"];
    for (let at = queue.shift(); at !== undefined; at = queue.shift())
      for (const next of nextStates(at))
        if (!seen.has(next)) {
          seen.add(next);
          queue.push(next);
        }
    expect([...seen].sort()).toEqual([...appointmentStates].sort());
    expect(stateMoves.every((m) => m.from !== m.to)).toBe(true);
  });

  it("gives time back for a cancelled visit alone", () => {
    expect(appointmentStates.filter((s) => !holdingStates.includes(s))).toEqual(["cancelled"]);
  });

  it("says states in the trade's words and in FHIR R4 codes", () => {
    // HL7 FHIR R4 AppointmentStatus value set, hl7.org/fhir/R4.
    const r4 = ["proposed", "pending", "booked", "arrived", "fulfilled", "cancelled", "noshow"];
    for (const s of appointmentStates) expect(r4).toContain(stateFacts[s].fhir);
    expect(appointmentStates.map((s) => stateFacts[s].word)).toEqual([
      "Booked",
      "Confirmed",
      "Arrived",
      "In session",
      "Attended",
      "Cancelled",
      "Did not attend",
    ]);
  });
});
