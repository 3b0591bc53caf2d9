"use client";
import { noteKindLabels } from "@withy/clinical/notes/headings";
import dynamic from "next/dynamic";
import { useState } from "react";
import { LastNote } from "./last-note";
import { MeasurePanel } from "./measure-panel";
import { NoteBar } from "./note-bar";
import type { NoteParts } from "./note-parts";
import { SignedNote } from "./signed-note";

const AddendumDialog = dynamic(() => import("./addendum-dialog").then((m) => m.AddendumDialog));

/** A note that is read: signed, or someone else's draft. */
export function ReadNote({ note, measures, day, visitDay, visitWords }: NoteParts) {
  const [isAdding, setIsAdding] = useState(false);
  const isSigned = note.state === "signed";
  return (
    <>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: it scrolls and holds no control, so keys must reach it */}
      <section className="write" id="write" tabIndex={0} aria-label={noteKindLabels[note.kind]}>
        <div className="write-title">
          <h2>{noteKindLabels[note.kind]}</h2>
          <span className="soft small num">{visitWords}</span>
          <span className="grow" />
          <b className="small">{isSigned ? "Signed" : `Draft by ${note.authorName}`}</b>
        </div>
        <SignedNote note={note} measures={measures} visitDay={visitDay} />
      </section>
      <aside className="beside" aria-label="Beside the note">
        <LastNote
          earlier={note.earlier}
          episodeId={note.episode.id}
          patientId={note.patient.id}
          zone={note.zone}
        />
        <MeasurePanel
          episodeId={note.episode.id}
          noteId={null}
          measures={measures}
          canRecord={false}
          isRecording={false}
          onRecording={() => undefined}
        />
      </aside>
      <NoteBar list={day} openNoteId={note.id}>
        {isSigned ? (
          <button type="button" className="sign" onClick={() => setIsAdding(true)}>
            Add an addendum
          </button>
        ) : (
          <span className="next soft">Only {note.authorName} may write here</span>
        )}
      </NoteBar>
      {isAdding && <AddendumDialog note={note} onClose={() => setIsAdding(false)} />}
    </>
  );
}
