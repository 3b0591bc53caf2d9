"use client";
import type { DayList, DayVisit } from "@withy/contracts/clinical";
import { Glyph } from "@withy/ui/glyph";
import { edgeGlyph } from "@withy/ui/state-mark";
import Link from "next/link";
import { appointmentStateLook } from "@/components/appointment-state-mark";
import { clockAt, weekdayAt } from "../site-time";

function noteWords(visit: DayVisit, openNoteId: string): string {
  if (visit.note?.state === "signed") return "signed";
  if (visit.note?.id === openNoteId) return "writing";
  if (visit.note) return "to sign";
  if (visit.state === "fulfilled" || visit.state === "in-session") return "no note yet";
  return visit.isFirstVisit ? "first visit" : "";
}

/** The therapist's day down the margin; each line leads to its note. */
export function DayStrip({ list, openNoteId }: { list: DayList; openNoteId: string }) {
  return (
    <nav className="day-strip" aria-label="Today's visits">
      <p className="note">{weekdayAt(`${list.day}T12:00:00Z`, list.zone)}</p>
      <ol>
        {list.visits.map((visit) => {
          const look = appointmentStateLook(visit.state);
          const words = noteWords(visit, openNoteId);
          const href = visit.note ? `/notes/${visit.note.id}` : `/notes?visit=${visit.appointmentId}`;
          return (
            <li key={visit.appointmentId} data-edge={look.edge}>
              <time dateTime={visit.startsAt}>{clockAt(visit.startsAt, list.zone)}</time>
              <Link href={href} aria-current={visit.note?.id === openNoteId ? "page" : undefined}>
                <b>
                  <Glyph name={edgeGlyph(look.edge)} />
                  <span>{visit.patientName.split(" ").slice(-1)}</span>
                  <span className="vh">, {look.label}</span>
                </b>
                {words !== "" && (
                  <span
                    className="how-far"
                    data-due={words === "to sign" || words === "no note yet" ? "" : undefined}
                  >
                    {words === "signed" && <Glyph name="tick" />}
                    {words}
                  </span>
                )}
              </Link>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
