import { outcomeLabels, referralSourceLabels } from "@withy/clinical/episodes/states";
import type { EpisodeView } from "@withy/contracts/clinical";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { longDay } from "../site-time";

/** How the patient came, what was planned and how it ended. */
export function EpisodeFacts({ episode }: { episode: EpisodeView }) {
  const at = `/patients/${episode.patient.id}`;
  const referrer = [referralSourceLabels[episode.referralSource], episode.referredBy]
    .filter((part) => part !== null)
    .join(", ");
  return (
    <section>
      <SectionHead title="About it" />
      <dl className="facts">
        <dt>Sent by</dt>
        <dd>{referrer}</dd>
        {episode.reason !== null && (
          <>
            <dt>Reason</dt>
            <dd>{episode.reason}</dd>
          </>
        )}
        <dt>Visits</dt>
        <dd className="num">
          {episode.notes} written{episode.plannedVisits !== null && `, ${episode.plannedVisits} planned`}
        </dd>
        {episode.dischargedOn !== null && (
          <>
            <dt>Discharged</dt>
            <dd>
              {longDay(episode.dischargedOn)}
              {episode.outcome !== null && `, ${outcomeLabels[episode.outcome].toLowerCase()}`}
            </dd>
          </>
        )}
        <dt>See also</dt>
        <dd>
          <Link href={`${at}/programme`}>Home programme</Link>, <Link href={`${at}/letters`}>letters</Link>
        </dd>
      </dl>
    </section>
  );
}
