import { type EdgeName, StateMark } from "@withy/ui/state-mark";
import { Section } from "./section";

const states: { edge: EdgeName; label: string; drawn: string }[] = [
  { edge: "thin", label: "Booked", drawn: "thin edge" },
  { edge: "double", label: "Confirmed", drawn: "double edge" },
  { edge: "thick", label: "Arrived", drawn: "thick edge" },
  { edge: "solid", label: "In session", drawn: "solid" },
  { edge: "dotted", label: "Attended", drawn: "dotted edge" },
  { edge: "broken", label: "Did not attend", drawn: "broken edge" },
  { edge: "struck", label: "Cancelled", drawn: "struck, no fill" },
  { edge: "hatch", label: "Blocked", drawn: "hatch" },
];

function Row({ grey }: { grey: boolean }) {
  return (
    <ul className="guide-states" data-grey={grey ? "" : undefined}>
      {states.map((state) => (
        <li key={state.edge}>
          <div className="timeblock" data-edge={state.edge}>
            <b>{state.edge === "hatch" ? "Supervision" : "Thandiwe Marsh"}</b>
            <StateMark code={state.edge} label={state.label} edge={state.edge} bare />
          </div>
          <StateMark code={state.edge} label={state.label} edge={state.edge} />
          <span className="soft small">{state.drawn}</span>
        </li>
      ))}
    </ul>
  );
}

/** The eight states, in colour and in grey. */
export function States() {
  return (
    <Section title="The eight states" note="Word, glyph, edge; tint last" aside="in colour, then in grey">
      <Row grey={false} />
      <Row grey />
    </Section>
  );
}
