import { headingsOf, noteKindLabels } from "@withy/clinical/notes/headings";
import type { EarlierNote } from "@withy/contracts/clinical";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { dayAt } from "../site-time";

export interface LastNoteProps {
  earlier: EarlierNote | null;
  episodeId: string;
  patientId: string;
  zone: string;
  /** Writes the plan of last time under this note's plan; absent where nothing can be written. */
  onBringForward?: ((plan: string) => void) | undefined;
}

/** The visit before, read while writing this one. */
export function LastNote({ earlier, episodeId, patientId, zone, onBringForward }: LastNoteProps) {
  const all = <Link href={`/patients/${patientId}/episodes/${episodeId}`}>all notes</Link>;
  if (!earlier) {
    return (
      <section className="last-note" aria-label="Last note">
        <SectionHead title="Last note" action={all} />
        <p className="soft">This is the first note of the episode.</p>
      </section>
    );
  }
  const { body, kind, visitAt, visitNumber, state } = earlier;
  const plan = body.plan;
  return (
    <section className="last-note" aria-label="Last note">
      <SectionHead
        title={kind === "initial" ? noteKindLabels.initial : "Last note"}
        aside={`${dayAt(visitAt, zone)}, visit ${visitNumber}, ${state}`}
        action={all}
      />
      {headingsOf(kind)
        .filter(({ key }) => (body[key] ?? "") !== "")
        .map(({ key, label }) => (
          <p key={key}>
            <b>{label}</b> {body[key]}
          </p>
        ))}
      {plan !== undefined && onBringForward && (
        <button type="button" className="linklike" onClick={() => onBringForward(plan)}>
          Bring the plan forward
        </button>
      )}
    </section>
  );
}
