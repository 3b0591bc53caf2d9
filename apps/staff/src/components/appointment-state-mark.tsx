import { type EdgeName, StateMark } from "@withy/ui/state-mark";

/** The one table of how an appointment's state looks and reads, for every screen that shows one. */
const looks: Record<string, { label: string; edge: EdgeName }> = {
  booked: { label: "Booked", edge: "thin" },
  confirmed: { label: "Confirmed", edge: "double" },
  arrived: { label: "Arrived", edge: "thick" },
  "in-session": { label: "In session", edge: "solid" },
  fulfilled: { label: "Attended", edge: "dotted" },
  noshow: { label: "Did not attend", edge: "broken" },
  cancelled: { label: "Cancelled", edge: "struck" },
};

/** Word and edge of an appointment's state; an unknown code is shown as it is. */
export function appointmentStateLook(code: string): { label: string; edge: EdgeName } {
  return looks[code] ?? { label: code, edge: "thin" };
}

export function AppointmentStateMark({ code, bare = false }: { code: string; bare?: boolean }) {
  const { label, edge } = appointmentStateLook(code);
  return <StateMark code={code} label={label} edge={edge} bare={bare} />;
}
