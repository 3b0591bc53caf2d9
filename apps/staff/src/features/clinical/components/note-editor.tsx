"use client";
import { readRedFlags } from "@withy/clinical/findings/red-flags";
import { headingsOf } from "@withy/clinical/notes/headings";
import type { MeasureSeriesView, NoteView } from "@withy/contracts/clinical";
import { AlertLine } from "@withy/ui/alert-line";
import type { NoteDraft } from "../hooks/use-note-draft";
import { clockAt } from "../site-time";
import { HeadingField } from "./heading-field";
import { MeasureLines } from "./measure-lines";

export interface NoteEditorProps {
  note: NoteView;
  draft: NoteDraft;
  redFlags: NoteView["episode"]["redFlags"];
  measures: readonly MeasureSeriesView[];
  visitDay: string;
  /** Headings named by a refused signature, until something is written there. */
  missing: readonly string[];
  onRedFlags: () => void;
  onMeasure: () => void;
}

/** The note on its lines, one field a heading. */
export function NoteEditor(props: NoteEditorProps) {
  const { note, draft, redFlags, measures, visitDay, missing, onRedFlags, onMeasure } = props;
  const reading = readRedFlags(note.episode.region, redFlags);
  const actions: Record<string, { words: string; run: () => void }> = {
    history: { words: reading.words.toLowerCase(), run: onRedFlags },
    examination: { words: "add a measure", run: onMeasure },
  };
  return (
    <>
      {draft.broughtBack !== null && (
        <AlertLine tone="ok">
          What you typed on this device at {clockAt(draft.broughtBack, note.zone)} was brought back.
        </AlertLine>
      )}
      {reading.present.map((flag) => (
        <AlertLine key={flag.question} tone={flag.isEmergency ? "danger" : "warning"}>
          {flag.question}. {flag.action}
        </AlertLine>
      ))}
      <div className="ruled">
        {headingsOf(note.kind).map((heading) => {
          const action = actions[heading.key];
          const text = draft.body[heading.key] ?? "";
          return (
            <HeadingField
              key={heading.key}
              heading={heading}
              value={text}
              onChange={(words) => draft.keeper.change(heading.key, words)}
              error={
                missing.includes(heading.key) && text.trim() === ""
                  ? "Write something here to sign"
                  : undefined
              }
              action={
                action && (
                  <button type="button" className="linklike" onClick={action.run}>
                    {action.words}
                  </button>
                )
              }
            >
              {heading.key === "examination" && <MeasureLines measures={measures} day={visitDay} />}
            </HeadingField>
          );
        })}
      </div>
    </>
  );
}
