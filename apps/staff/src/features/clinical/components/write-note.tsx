"use client";
import { emptyHeadings } from "@withy/clinical/notes/check-note";
import { noteKindLabels } from "@withy/clinical/notes/headings";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useNoteChange } from "../hooks/use-note";
import { useNoteDraft } from "../hooks/use-note-draft";
import { useSignNote } from "../hooks/use-sign-note";
import { LastNote } from "./last-note";
import { MeasurePanel } from "./measure-panel";
import { NoteBar } from "./note-bar";
import { NoteEditor } from "./note-editor";
import type { NoteParts } from "./note-parts";
import { SavedMark } from "./saved-mark";

const ClashDialog = dynamic(() => import("./clash-dialog").then((m) => m.ClashDialog));
const RedFlagsDialog = dynamic(() => import("./red-flags-dialog").then((m) => m.RedFlagsDialog));
const SignDialog = dynamic(() => import("./sign-dialog").then((m) => m.SignDialog));

type Open = "sign" | "flags" | "clash" | null;

function goTo(id: string) {
  const target = document.getElementById(id);
  target?.scrollIntoView({ block: "center" });
  target?.focus();
}

/** Writing, measuring and signing, with the last visit beside. */
export function WriteNote({ note, measures, day, visitDay, visitWords }: NoteParts) {
  const draft = useNoteDraft(note);
  const sign = useSignNote(note, draft);
  const [open, setOpen] = useState<Open>(null);
  const [isRecording, setIsRecording] = useState(false);
  const [missing, setMissing] = useState<readonly string[]>([]);
  const hold = useNoteChange(note);
  const openSign = () => {
    setMissing(emptyHeadings(note.kind, draft.body).map(({ key }) => key));
    sign.reset();
    setOpen("sign");
    void draft.keeper.flush();
  };
  const measureNow = () => {
    setIsRecording(true);
    window.setTimeout(() => goTo("measure-choice"), 0);
  };
  useShortcut("sign", openSign, open === null);
  useShortcut("measure", measureNow);
  const close = () => setOpen(null);
  const bringForward = (plan: string) => {
    const own = (draft.body.plan ?? "").trim();
    draft.keeper.change("plan", own === "" ? plan : `${own}\n${plan}`);
    goTo("heading-plan");
  };
  return (
    <>
      <section className="write" id="write" aria-label={noteKindLabels[note.kind]}>
        <div className="write-title">
          <h2>{noteKindLabels[note.kind]}</h2>
          <span className="soft small num">{visitWords}</span>
          <span className="grow" />
          {draft.clash && (
            <button type="button" className="linklike danger" onClick={() => setOpen("clash")}>
              Compare the two texts
            </button>
          )}
          <SavedMark draft={draft} zone={note.zone} />
        </div>
        <NoteEditor
          note={note}
          draft={draft}
          redFlags={note.episode.redFlags}
          measures={measures}
          visitDay={visitDay}
          missing={missing}
          onRedFlags={() => setOpen("flags")}
          onMeasure={measureNow}
        />
      </section>
      <aside className="beside" aria-label="Beside the note">
        <LastNote
          earlier={note.earlier}
          episodeId={note.episode.id}
          patientId={note.patient.id}
          zone={note.zone}
          onBringForward={bringForward}
        />
        <MeasurePanel
          episodeId={note.episode.id}
          noteId={note.id}
          measures={measures}
          canRecord
          isRecording={isRecording}
          onRecording={setIsRecording}
        />
      </aside>
      <NoteBar list={day} openNoteId={note.id}>
        <button type="button" className="sign" onClick={openSign} aria-keyshortcuts="Control+Enter">
          Sign…
        </button>
      </NoteBar>
      {open === "sign" && (
        <SignDialog
          note={note}
          draft={draft}
          sign={sign}
          onClose={close}
          onGoTo={(key) => {
            close();
            window.setTimeout(() => goTo(`heading-${key}`), 150);
          }}
        />
      )}
      {open === "flags" && (
        <RedFlagsDialog
          episode={note.episode}
          onSaved={(saved) => hold((held) => ({ ...held, episode: { ...held.episode, ...saved } }))}
          onClose={close}
        />
      )}
      {open === "clash" && draft.clash && <ClashDialog note={note} draft={draft} onClose={close} />}
    </>
  );
}
