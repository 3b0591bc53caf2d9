// biome-ignore-all lint/a11y/useSemanticElements: cells that stand at their minute cannot be rows of a table
import type { DayAppointment, DayColumn, DiaryDayView } from "@withy/contracts/diary";
import { classNames } from "@withy/ui/class-names";
import { Glyph } from "@withy/ui/glyph";
import type { CSSProperties, PointerEvent } from "react";
import { AppointmentStateMark, appointmentStateLook } from "@/components/appointment-state-mark";
import { type Cursor, type Place, pixelsPerMinute, stepMinutes } from "../day-cursor";
import { clock, span } from "../minute-words";
import { top } from "./day-rail";

/** A cell stands in its lane and at its minute, whatever row of the grid it belongs to. */
function spot(column: number, fromMinute: number, minutes: number, day: DiaryDayView): CSSProperties {
  return {
    top: top(fromMinute, day) + 1,
    height: minutes * pixelsPerMinute - 2,
    left: `calc(${column} * 100% / ${day.columns.length} + 3px)`,
    width: `calc(100% / ${day.columns.length} - 6px)`,
  };
}

const cancelledPixels = 20;

export interface AppointmentCellProps {
  day: DiaryDayView;
  column: number;
  appointment: DayAppointment;
  isUnderCursor: boolean;
  isChosen: boolean;
  isDragged: boolean;
  onOpen: () => void;
  onPointerDown?: ((event: PointerEvent<HTMLDivElement>) => void) | undefined;
}

function spoken(a: DayAppointment, byRoom: boolean): string {
  const where = byRoom ? a.therapistName : a.roomName;
  return `${clock(a.fromMinute)} to ${clock(a.untilMinute)}, ${a.patientName}, ${a.serviceName}, ${where}, ${appointmentStateLook(a.state).label}`;
}

/** One visit in the grid. */
export function AppointmentCell(props: AppointmentCellProps) {
  const { day, column, appointment: a, isUnderCursor, isChosen } = props;
  const minutes = a.untilMinute - a.fromMinute;
  const isCancelled = a.state === "cancelled";
  const position = spot(column, a.fromMinute, minutes, day);
  const byRoom = day.by === "room";
  return (
    // biome-ignore lint/a11y/useKeyWithClickEvents: the grid handles Enter for its cells
    <div
      role="gridcell"
      className={classNames("timeblock daycell", isChosen && "chosen", props.isDragged && "dragged")}
      data-edge={appointmentStateLook(a.state).edge}
      data-appointment={a.id}
      style={isCancelled ? { ...position, height: cancelledPixels } : position}
      aria-colindex={column + 2}
      aria-rowspan={Math.max(1, Math.round(minutes / stepMinutes))}
      aria-selected={isChosen}
      aria-label={spoken(a, byRoom)}
      tabIndex={isUnderCursor ? 0 : -1}
      data-cursor={isUnderCursor ? "" : undefined}
      onClick={props.onOpen}
      onPointerDown={props.onPointerDown}
    >
      <b>
        {a.fromMinute % 15 !== 0 && <span className="off num">:{clock(a.fromMinute).slice(3)}</span>}
        {isCancelled && <Glyph name="struck" />}
        {a.patientName}
      </b>
      {!isCancelled && minutes >= 25 && (
        <span className="word">
          <AppointmentStateMark code={a.state} bare />
          <span className="room soft">{byRoom ? a.therapistName.split(" ")[0] : a.roomName}</span>
        </span>
      )}
      {!isCancelled && minutes >= 40 && a.serviceKind !== "follow-up" && (
        <span className="soft what">{a.serviceName}</span>
      )}
    </div>
  );
}

function placeWords(place: Place): string {
  if (place.kind === "block") return `${place.reason}, until ${clock(place.until)}`;
  if (place.kind === "free") return "free";
  return place.kind === "past" ? "over" : "not working";
}

/** The cursor where there is no visit: a pencil mark that says what the place is. */
export function CursorCell({
  day,
  cursor,
  place,
  column,
}: {
  day: DiaryDayView;
  cursor: Cursor;
  place: Place;
  column: DayColumn;
}) {
  const free = place.kind === "free" ? place.until - cursor.minute : 0;
  const words = place.kind === "free" ? `free for ${span(free)}` : placeWords(place);
  return (
    <div
      role="gridcell"
      className="daycursor num"
      style={spot(cursor.column, cursor.minute, Math.max(15, Math.min(free, 30)), day)}
      aria-colindex={cursor.column + 2}
      aria-label={`${clock(cursor.minute)}, ${column.name}, ${words}`}
      tabIndex={0}
      data-cursor=""
    >
      {clock(cursor.minute)} <span>{place.kind === "free" ? span(free) : placeWords(place)}</span>
    </div>
  );
}
