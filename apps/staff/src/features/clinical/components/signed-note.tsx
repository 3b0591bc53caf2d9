"use client";
import { headingsOf } from "@withy/clinical/notes/headings";
import type { MeasureSeriesView, NoteView } from "@withy/contracts/clinical";
import { clockAt, dayAt } from "../site-time";
import { MeasureLines } from "./measure-lines";

export interface SignedNoteProps {
  note: NoteView;
  measures: readonly MeasureSeriesView[];
  visitDay: string;
}

/** A note that nobody can change any more: its words, its signature and what was added later. */
export function SignedNote({ note, measures, visitDay }: SignedNoteProps) {
  return (
    <>
      <div className="ruled">
        {headingsOf(note.kind)
          .filter(({ key }) => (note.body[key] ?? "") !== "" || key === "examination")
          .map(({ key, label }) => (
            <section key={key} className="heading-field">
              <h3 className="heading-line">{label}</h3>
              {key === "examination" && <MeasureLines measures={measures} day={visitDay} />}
              <p className="written">{note.body[key]}</p>
            </section>
          ))}
      </div>
      {note.state === "signed" ? (
        <footer className="signature">
          <p>
            <b>
              Signed by {note.signedName}, {note.registrationNumber}
            </b>
            ,{" "}
            {note.signedAt !== null &&
              `${dayAt(note.signedAt, note.zone)} at ${clockAt(note.signedAt, note.zone)}`}
          </p>
          <p className="small soft">
            {note.entryWords}. Fingerprint of the text{" "}
            <span className="num">{note.bodyHash?.slice(0, 16)}</span>
          </p>
        </footer>
      ) : (
        <footer className="signature">
          <p className="soft">Draft by {note.authorName}. Not signed yet.</p>
        </footer>
      )}
      {note.addenda.map((addendum) => (
        <section key={addendum.id} className="addendum" aria-label="Addendum">
          <p className="small soft">
            Addendum by {addendum.authorName}
            {addendum.registrationNumber !== null && `, ${addendum.registrationNumber}`},{" "}
            {dayAt(addendum.writtenAt, note.zone)} at {clockAt(addendum.writtenAt, note.zone)}. Reason:{" "}
            {addendum.reason}
          </p>
          <p className="written">{addendum.text}</p>
        </section>
      ))}
    </>
  );
}
