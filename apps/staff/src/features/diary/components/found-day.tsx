"use client";
import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { DayColumn, FoundTimeView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { fetchDay } from "../api-client";
import { shownAppointments } from "../day-cursor";
import { clock, minuteOf } from "../minute-words";
import { diaryKeys } from "../query-keys";

const hoursShown = 5;
const pixelsPerMinute = 1.2;

export interface FoundDayProps {
  times: readonly FoundTimeView[];
  chosen: FoundTimeView;
  onChoose: (index: number) => void;
}

/** The part of the day that the chosen time would fall into, with the other offers of that day as ghosts. */
export function FoundDay({ times, chosen, onChoose }: FoundDayProps) {
  const filters = { day: chosen.day, siteIds: [chosen.site.id], by: "therapist" as const };
  const day = useQuery({
    queryKey: diaryKeys.day(filters),
    queryFn: ({ signal }) => fetchDay(filters, signal),
    placeholderData: keepPreviousData,
  }).data;
  const start = Math.max(0, Math.floor((minuteOf(chosen.startTime) - 120) / 60) * 60);
  const end = start + hoursShown * 60;
  const ghosts = times
    .map((time, index) => ({ time, index }))
    .filter(({ time }) => time.day === chosen.day && time.site.id === chosen.site.id);
  const wanted = [...new Set([chosen.therapist.id, ...ghosts.map(({ time }) => time.therapist.id)])].slice(
    0,
    3,
  );
  const columns = wanted
    .map((id) => day?.columns.find((column) => column.id === id))
    .filter((c) => c !== undefined);
  return (
    <aside className="foundday" aria-label="The day around it">
      <SectionHead
        title={titleDate(chosen.day).replace(/ \w+$/, "")}
        aside={chosen.site.name}
        action={<Link href={`/diary?day=${chosen.day}&site=${chosen.site.id}`}>whole day</Link>}
      />
      <div className="minigrid">
        <div className="minihours">
          {Array.from({ length: hoursShown + 1 }, (_, i) => start + i * 60).map((minute) => (
            <span key={minute} className="num" style={{ top: 24 + (minute - start) * pixelsPerMinute }}>
              {clock(minute)}
            </span>
          ))}
        </div>
        {columns.map((column) => (
          <div key={column.id} className="minilane">
            <b>{column.name.split(" ")[0]}</b>
            <div className="minibody">
              <Taken column={column} start={start} end={end} />
              {ghosts
                .filter(({ time }) => time.therapist.id === column.id)
                .map(({ time, index }) => (
                  <button
                    key={time.startsAt}
                    type="button"
                    className="ghost"
                    data-chosen={time === chosen ? "" : undefined}
                    style={spot(minuteOf(time.startTime), minuteOf(time.endTime), start, end)}
                    onClick={() => onChoose(index)}
                    aria-label={`Time ${index + 1}, ${time.startTime} with ${time.therapist.name}`}
                  >
                    <b className="num">{index + 1}</b>
                    <span className="num">{time.startTime}</span>
                  </button>
                ))}
            </div>
          </div>
        ))}
      </div>
      <p className="small soft">Numbers are places in the list. Grey is taken; dotted is a break.</p>
    </aside>
  );
}

function spot(from: number, until: number, start: number, end: number) {
  const top = Math.max(from, start);
  const bottom = Math.min(until, end);
  const display = bottom <= top ? { display: "none" } : {};
  return { top: (top - start) * pixelsPerMinute, height: (bottom - top) * pixelsPerMinute - 2, ...display };
}

function Taken({ column, start, end }: { column: DayColumn; start: number; end: number }) {
  return (
    <>
      {column.hours.map((hours) => (
        <i
          key={`h${hours.fromMinute}`}
          className="hours"
          style={spot(hours.fromMinute, hours.untilMinute, start, end)}
        />
      ))}
      {column.blocks.map((block) => (
        <i
          key={`b${block.fromMinute}`}
          className="taken"
          data-kind={block.kind}
          style={spot(block.fromMinute, block.untilMinute, start, end)}
        />
      ))}
      {shownAppointments(column)
        .filter((visit) => visit.state !== "cancelled")
        .map((visit) => (
          <i key={visit.id} className="taken" style={spot(visit.fromMinute, visit.untilMinute, start, end)} />
        ))}
    </>
  );
}
