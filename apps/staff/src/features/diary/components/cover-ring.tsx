import type { CoverPlanView } from "@withy/contracts/diary";
import { Line } from "@withy/ui/line";
import { SectionHead } from "@withy/ui/section-head";
import { counted, placeWords, totalsOf } from "../cover-words";

/** Whoever gets no message, with the number and what to say: once the visits have moved. */
export function CoverRing({ plan }: { plan: CoverPlanView }) {
  const { ring } = totalsOf(plan.moves);
  if (plan.state !== "applied" || ring.length === 0) return null;
  return (
    <section aria-labelledby="ring-title">
      <div className="body">
        <SectionHead id="ring-title" title="To ring" aside={counted(ring.length, "patient")} />
      </div>
      {ring.map(({ id, patient, before, place }) => (
        <Line key={id} gutter={before.startTime} tick className="coverline">
          <span>{patient.name}</span>
          {patient.phone ? (
            <a className="num" href={`tel:${patient.phone}`}>
              {patient.phone}
            </a>
          ) : (
            <span className="soft">no number</span>
          )}
          <span className="num">
            {place ? `now ${placeWords(place, before.site.id)}` : "has no new place yet"}
          </span>
        </Line>
      ))}
    </section>
  );
}
