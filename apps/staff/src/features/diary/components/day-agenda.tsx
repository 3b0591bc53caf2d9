"use client";
import type { DayAppointment, DiaryDayView } from "@withy/contracts/diary";
import { Choice } from "@withy/ui/choice";
import { useEffect, useRef, useState } from "react";
import { AppointmentStateMark, appointmentStateLook } from "@/components/appointment-state-mark";
import { shownAppointments } from "../day-cursor";
import { clock } from "../minute-words";

interface AgendaLine {
  readonly appointment: DayAppointment;
  readonly isFirstAtTime: boolean;
  readonly isFirstAfterNow: boolean;
}

function linesOf(day: DiaryDayView, only: string, now: number | null): AgendaLine[] {
  const columns = only === "" ? day.columns : day.columns.filter((column) => column.id === only);
  const visits = columns
    .flatMap(shownAppointments)
    .sort((a, b) => a.fromMinute - b.fromMinute || a.therapistName.localeCompare(b.therapistName));
  const next = now === null ? -1 : visits.findIndex((visit) => visit.fromMinute > now);
  return visits.map((appointment, i) => ({
    appointment,
    isFirstAtTime: visits[i - 1]?.fromMinute !== appointment.fromMinute,
    isFirstAfterNow: i === next,
  }));
}

export interface DayAgendaProps {
  day: DiaryDayView;
  now: number | null;
  chosenId: string | null;
  onOpen: (appointment: DayAppointment) => void;
}

/** The same day as a list, for a narrow window and for paper. */
export function DayAgenda({ day, now, chosenId, onOpen }: DayAgendaProps) {
  const [only, setOnly] = useState("");
  const seen = new Map(day.columns.map((column) => [column.id, column.name]));
  const options = [
    { value: "", label: "Everyone" },
    ...[...seen].map(([id, name]) => ({
      value: id,
      label: day.by === "room" ? name : (name.split(" ")[0] ?? name),
      fullLabel: name,
    })),
  ];
  const lines = linesOf(day, only, now);
  const list = useRef<HTMLElement>(null);
  // On a phone the list opens at the present; in a wide window it is not shown and nothing happens.
  useEffect(() => {
    const mark = list.current?.querySelector<HTMLElement>(".agendanow");
    if (mark?.offsetParent && list.current)
      list.current.scrollTop = mark.offsetTop - list.current.offsetTop - 160;
  }, []);
  return (
    <section ref={list} className="dayagenda" aria-label="The day as a list">
      <div className="agendawho">
        <Choice label="Whose day" options={options} value={only} onChange={setOnly} />
      </div>
      {lines.length === 0 && <p className="agendanone soft">No visits on this day.</p>}
      <ol>
        {lines.map((line) => (
          <li key={`${line.appointment.id} ${line.appointment.therapistId}`}>
            {line.isFirstAfterNow && now !== null && (
              <div className="agendanow">
                <span>
                  <span className="vh">Now, </span>
                  {clock(now)}
                </span>
              </div>
            )}
            <AgendaVisit line={line} isChosen={line.appointment.id === chosenId} onOpen={onOpen} />
          </li>
        ))}
      </ol>
    </section>
  );
}

function AgendaVisit({
  line,
  isChosen,
  onOpen,
}: {
  line: AgendaLine;
  isChosen: boolean;
  onOpen: (a: DayAppointment) => void;
}) {
  const { appointment: a } = line;
  return (
    <div className="agendaline">
      <span className="at num">
        {line.isFirstAtTime ? clock(a.fromMinute) : <span className="vh">{clock(a.fromMinute)}</span>}
      </span>
      <button
        type="button"
        className="timeblock agendavisit"
        data-edge={appointmentStateLook(a.state).edge}
        aria-pressed={isChosen}
        onClick={() => onOpen(a)}
      >
        <b>{a.patientName}</b>
        <span className="where soft">
          {a.therapistName.split(" ")[0]}, {a.roomName}
        </span>
        <AppointmentStateMark code={a.state} bare />
        <span className="where soft">{a.serviceKind === "follow-up" ? "" : a.serviceName}</span>
      </button>
    </div>
  );
}
