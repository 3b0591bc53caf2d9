"use client";
import { noteKindLabels } from "@withy/clinical/notes/headings";
import type { UnsignedItem } from "@withy/contracts/clinical";
import { Button, ButtonLink } from "@withy/ui/button";
import { Line } from "@withy/ui/line";
import Link from "next/link";
import { clockAt, isoDayAt, shortDay } from "../site-time";

export interface UnsignedLineProps {
  item: UnsignedItem;
  zone: string;
  onStart: (visit: { appointmentId: string; patientId: string }) => void;
}

function lackWords(item: UnsignedItem): string {
  if (item.noteId === null) return "No note yet";
  return item.emptyHeadings.length === 0
    ? "Written, to sign"
    : `Still empty: ${item.emptyHeadings.join(", ")}`;
}

/** A note of an earlier day that has no signature, and what it lacks. */
export function UnsignedLine({ item, zone, onStart }: UnsignedLineProps) {
  const { noteId, appointmentId, patientId } = item;
  return (
    <Line gutter={<time dateTime={item.visitAt}>{shortDay(isoDayAt(item.visitAt, zone))}</time>} tick>
      <div className="visit">
        <span className="visit-who">
          <Link href={`/patients/${patientId}`}>{item.patientName}</Link>
          <span className="soft small num">
            {item.kind === null ? "Visit" : noteKindLabels[item.kind]} at {clockAt(item.visitAt, zone)}
          </span>
        </span>
        <span className="how-far lacks" data-due="">
          {lackWords(item)}
        </span>
        <span className="visit-do">
          {noteId !== null ? (
            <ButtonLink as={Link} size="small" href={`/notes/${noteId}`}>
              Write on<span className="vh"> the note of {item.patientName}</span>
            </ButtonLink>
          ) : (
            appointmentId !== null && (
              <Button size="small" onClick={() => onStart({ appointmentId, patientId })}>
                Write the note<span className="vh"> of {item.patientName}</span>
              </Button>
            )
          )}
        </span>
      </div>
    </Line>
  );
}
