"use client";
import type { DayList } from "@withy/contracts/clinical";
import Link from "next/link";
import type { ReactNode } from "react";
import { AppointmentStateMark } from "@/components/appointment-state-mark";
import { clockAt } from "../site-time";

/** Today, Write, Next and the one thing to do, where the thumb is. */
export function NoteBar({
  list,
  openNoteId,
  children,
}: {
  list: DayList;
  openNoteId: string;
  children: ReactNode;
}) {
  const at = list.visits.findIndex((visit) => visit.note?.id === openNoteId);
  const next = list.visits
    .slice(at + 1)
    .find((visit) => visit.state !== "noshow" && visit.note?.state !== "signed");
  const href = next?.note ? `/notes/${next.note.id}` : `/notes?visit=${next?.appointmentId ?? ""}`;
  return (
    <nav className="note-bar" aria-label="At hand">
      <Link href="/notes">Today</Link>
      <a href="#write" aria-current="page">
        Write
      </a>
      {next ? (
        <Link className="next" href={href}>
          <span>Next</span>
          <span className="next-who">
            <AppointmentStateMark code={next.state} />
            <span>
              {next.patientName}, {clockAt(next.startsAt, list.zone)}
            </span>
          </span>
        </Link>
      ) : (
        <span className="next soft">No one after this</span>
      )}
      {children}
    </nav>
  );
}
