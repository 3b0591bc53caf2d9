"use client";
import type { DayVisit } from "@withy/contracts/clinical";
import { Button, ButtonLink } from "@withy/ui/button";
import { Glyph } from "@withy/ui/glyph";
import { Line } from "@withy/ui/line";
import Link from "next/link";
import { useEffect, useRef } from "react";
import { AppointmentStateMark } from "@/components/appointment-state-mark";
import { clockAt } from "../site-time";

export interface VisitLineProps {
  visit: DayVisit;
  zone: string;
  isChosen: boolean;
  onStart: () => void;
}

function noteWords(visit: DayVisit): { words: string; isDue: boolean } {
  if (visit.note?.state === "signed") return { words: "Signed", isDue: false };
  if (visit.note) return { words: "To sign", isDue: true };
  if (visit.state === "fulfilled") return { words: "No note yet", isDue: true };
  return { words: "", isDue: false };
}

/** One visit of the day and the one thing to do about its note. */
export function VisitLine({ visit, zone, isChosen, onStart }: VisitLineProps) {
  const button = useRef<HTMLButtonElement>(null);
  useEffect(() => {
    if (isChosen) button.current?.focus();
  }, [isChosen]);
  const { words, isDue } = noteWords(visit);
  return (
    <Line
      gutter={<time dateTime={visit.startsAt}>{clockAt(visit.startsAt, zone)}</time>}
      tick
      chosen={isChosen}
    >
      <div className="visit">
        <span className="visit-who">
          <Link href={`/patients/${visit.patientId}`}>{visit.patientName}</Link>
          <span className="soft small">
            {visit.serviceName}, {visit.siteName}
          </span>
        </span>
        <AppointmentStateMark code={visit.state} />
        <span className="how-far" data-due={isDue ? "" : undefined}>
          {words === "Signed" && <Glyph name="tick" />}
          {words}
        </span>
        <span className="visit-do">
          {visit.note ? (
            <ButtonLink
              as={Link}
              size="small"
              kind={isDue ? "primary" : "quiet"}
              href={`/notes/${visit.note.id}`}
            >
              {visit.note.state === "signed" ? "Read" : "Write on"}
              <span className="vh"> the note of {visit.patientName}</span>
            </ButtonLink>
          ) : (
            visit.state !== "noshow" && (
              <Button size="small" ref={button} onClick={onStart}>
                Write the note<span className="vh"> of {visit.patientName}</span>
              </Button>
            )
          )}
        </span>
      </div>
    </Line>
  );
}
