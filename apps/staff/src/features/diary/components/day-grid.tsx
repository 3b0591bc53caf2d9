// biome-ignore-all lint/a11y/useSemanticElements: cells that stand at their minute cannot be rows of a table
"use client";
import type { DayAppointment, DiaryDayView, HeldTime } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { type KeyboardEvent, type RefObject, useEffect, useRef } from "react";
import {
  type Cursor,
  moveCursor,
  pixelsPerMinute,
  placeAt,
  shownAppointments,
  stepMinutes,
} from "../day-cursor";
import { type Drag, useDayDrag } from "../hooks/use-day-drag";
import { clock } from "../minute-words";
import { AppointmentCell, CursorCell } from "./day-cell";
import { DayHead } from "./day-head";
import { DayLanes, DayRail, place, top } from "./day-rail";
import { HeldLanes } from "./held-times";

export interface DayGridProps {
  day: DiaryDayView;
  today: string;
  now: number | null;
  /** What other people are booking at this moment. */
  held?: readonly HeldTime[];
  cursor: Cursor;
  onCursor: (cursor: Cursor) => void;
  chosenId: string | null;
  onOpen: (appointment: DayAppointment) => void;
  /** Enter on a free place. */
  onBook: () => void;
  onDrop?: ((drag: Drag) => void) | undefined;
  onColumns: (by: "therapist" | "room") => void;
}

/** Every visit by the minute that it starts at: one row of the grid for each. */
function rowsOf(
  day: DiaryDayView,
  cursor: Cursor,
  isOnVisit: boolean,
): [number, { column: number; visit: DayAppointment }[]][] {
  const rows = new Map<number, { column: number; visit: DayAppointment }[]>();
  day.columns.forEach((column, index) => {
    for (const visit of shownAppointments(column)) {
      rows.set(visit.fromMinute, [...(rows.get(visit.fromMinute) ?? []), { column: index, visit }]);
    }
  });
  if (!isOnVisit && !rows.has(cursor.minute)) rows.set(cursor.minute, []);
  return [...rows].sort(([a], [b]) => a - b);
}

/** Scrolls to the present hour once, and keeps the focus on the cursor while the keyboard is in the grid. */
function useFocus(
  grid: RefObject<HTMLDivElement | null>,
  day: DiaryDayView,
  now: number | null,
  cursor: Cursor,
) {
  const keyed = useRef(false);
  useEffect(() => {
    if (grid.current) grid.current.scrollTop = Math.max(0, top((now ?? day.bounds.fromMinute) - 90, day));
  }, [day.day]);
  useEffect(() => {
    if (!keyed.current) return;
    keyed.current = false;
    const cell = grid.current?.querySelector<HTMLElement>("[data-cursor]");
    cell?.focus({ preventScroll: true });
    cell?.scrollIntoView({ block: "nearest", inline: "nearest" });
  }, [cursor.column, cursor.minute]);
  return keyed;
}

/** The day: a column for each therapist or room, five minutes a step, every visit a cell that the arrows reach. */
export function DayGrid(props: DayGridProps) {
  const { day, now, cursor, chosenId } = props;
  const grid = useRef<HTMLDivElement>(null);
  const lanes = useRef<HTMLDivElement>(null);
  const keyed = useFocus(grid, day, now, cursor);
  const { drag, start, isClick } = useDayDrag(lanes, day, (dropped) => props.onDrop?.(dropped));
  const under = placeAt(day, cursor);
  const cursorColumn = day.columns[cursor.column];

  const onKeyDown = (event: KeyboardEvent) => {
    if (!(event.target instanceof HTMLElement) || event.target.closest("[data-cursor]") === null) return;
    if (event.key === "Enter") {
      event.preventDefault();
      return under.kind === "appointment" ? props.onOpen(under.appointment) : props.onBook();
    }
    const next = event.altKey ? null : moveCursor(day, cursor, event.key, event.ctrlKey || event.metaKey);
    if (!next) return;
    event.preventDefault();
    keyed.current = true;
    props.onCursor(next);
  };

  return (
    <div
      ref={grid}
      className="daygrid"
      role="grid"
      aria-label={`${titleDate(day.day)}, ${day.sites.map((site) => site.name).join(", ")}`}
      aria-rowcount={(day.bounds.untilMinute - day.bounds.fromMinute) / stepMinutes + 1}
      aria-colcount={day.columns.length + 1}
      onKeyDown={onKeyDown}
    >
      <DayHead day={day} today={props.today} onColumns={props.onColumns} />
      <div
        className="daybody"
        style={{ height: (day.bounds.untilMinute - day.bounds.fromMinute) * pixelsPerMinute }}
      >
        <DayRail day={day} />
        <div className="dayfield" ref={lanes}>
          <DayLanes day={day} now={now} />
          {props.held && <HeldLanes day={day} held={props.held} />}
          {rowsOf(day, cursor, under.kind === "appointment").map(([minute, cells]) => (
            // biome-ignore lint/a11y/useFocusableInteractive: rows take no focus
            <div
              key={minute}
              role="row"
              className="dayrow"
              aria-rowindex={(minute - day.bounds.fromMinute) / stepMinutes + 2}
            >
              <span
                role="rowheader"
                tabIndex={-1}
                className="vh"
                style={{ top: top(minute, day) }}
                aria-colindex={1}
              >
                {clock(minute)}
              </span>
              {cells.map(({ column, visit }) => (
                <AppointmentCell
                  key={`${column} ${visit.id}`}
                  day={day}
                  column={column}
                  appointment={visit}
                  isUnderCursor={
                    under.kind === "appointment" &&
                    under.appointment.id === visit.id &&
                    column === cursor.column
                  }
                  isChosen={visit.id === chosenId}
                  isDragged={drag?.appointment.id === visit.id}
                  onOpen={() => {
                    if (!isClick()) return;
                    props.onCursor({ column, minute: visit.fromMinute });
                    props.onOpen(visit);
                  }}
                  onPointerDown={props.onDrop ? (event) => start(event, visit) : undefined}
                />
              ))}
              {minute === cursor.minute && under.kind !== "appointment" && cursorColumn && (
                <CursorCell day={day} cursor={cursor} place={under} column={cursorColumn} />
              )}
            </div>
          ))}
          {drag && <DragGhost day={day} drag={drag} />}
        </div>
        {now !== null && (
          <span className="now-tab" style={{ top: top(now, day) }} aria-hidden="true">
            {clock(now)}
          </span>
        )}
      </div>
    </div>
  );
}

function DragGhost({ day, drag }: { day: DiaryDayView; drag: Drag }) {
  const { appointment, to } = drag;
  const length = appointment.untilMinute - appointment.fromMinute;
  const style = {
    ...place(to.minute, to.minute + length, day),
    left: `calc(${to.column} * 100% / ${day.columns.length})`,
    width: `calc(100% / ${day.columns.length})`,
  };
  return (
    <div className="dayghost num" style={style} aria-hidden="true">
      <b>{clock(to.minute)}</b> {appointment.patientName}
    </div>
  );
}
