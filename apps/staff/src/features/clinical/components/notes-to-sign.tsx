"use client";
import type { DayList, DayVisit, UnsignedItem } from "@withy/contracts/clinical";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useDayList } from "../hooks/use-day-list";
import { useUnsignedNotes } from "../hooks/use-unsigned-notes";
import { weekdayAt } from "../site-time";
import { UnsignedLine } from "./unsigned-line";
import { VisitLine } from "./visit-line";

const StartNote = dynamic(() => import("./start-note").then((m) => m.StartNote));

export interface NotesToSignProps {
  day: DayList;
  unsigned: UnsignedItem[];
  /** The visit that another page sent here to be written. */
  chosenVisit: string | null;
}

const isWaiting = (visit: DayVisit) => visit.state !== "noshow" && visit.note?.state !== "signed";

function leadWords(visits: readonly DayVisit[], earlier: number): string {
  const open = visits.filter(
    (visit) => isWaiting(visit) && (visit.note || visit.state === "fulfilled"),
  ).length;
  const today = open === 0 ? "Nothing to sign from today yet" : `${open} to sign from today`;
  return earlier === 0 ? today : `${today}, ${earlier} from earlier days`;
}

/** The therapist's day with how far each note has come, then what still waits from earlier days. */
export function NotesToSign({ day: firstDay, unsigned: firstUnsigned, chosenVisit }: NotesToSignProps) {
  const day = useDayList(firstDay).data;
  const unsigned = useUnsignedNotes(firstUnsigned).data;
  const [starting, setStarting] = useState<{ appointmentId: string; patientId: string } | null>(null);
  const today = new Set(day.visits.map((visit) => visit.appointmentId));
  const earlier = unsigned.filter((item) => item.appointmentId === null || !today.has(item.appointmentId));
  return (
    <Page className="notes-to-sign">
      <PageTitle
        title="Notes to sign"
        note={weekdayAt(`${day.day}T12:00:00Z`, day.zone)}
        lead={leadWords(day.visits, earlier.length)}
      />
      <section aria-labelledby="today-head">
        <PageBody className="section-line">
          <SectionHead
            id="today-head"
            title="Today"
            aside={`${day.visits.length} ${day.visits.length === 1 ? "visit" : "visits"}`}
          />
        </PageBody>
        {day.visits.map((visit) => (
          <VisitLine
            key={visit.appointmentId}
            visit={visit}
            zone={day.zone}
            isChosen={visit.appointmentId === chosenVisit}
            onStart={() => setStarting(visit)}
          />
        ))}
        {day.visits.length === 0 && (
          <PageBody>
            <EmptyState title="No visits in your diary today">Your next visits are in the diary.</EmptyState>
          </PageBody>
        )}
      </section>
      <section aria-labelledby="earlier-head">
        <PageBody className="section-line">
          <SectionHead
            id="earlier-head"
            title="From earlier days"
            aside={earlier.length === 0 ? "nothing waits" : "oldest first"}
          />
        </PageBody>
        {earlier.map((item) => (
          <UnsignedLine
            key={item.noteId ?? item.appointmentId}
            item={item}
            zone={day.zone}
            onStart={setStarting}
          />
        ))}
      </section>
      {starting && <StartNote {...starting} onClose={() => setStarting(null)} />}
    </Page>
  );
}
