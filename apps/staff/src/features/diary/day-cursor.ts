import type { DayAppointment, DayColumn, DayHours, DiaryDayView } from "@withy/contracts/diary";

export const stepMinutes = 5;
export const pixelsPerMinute = 1.6;

/** Where the keyboard stands in a day: a column and a minute after midnight. */
export interface Cursor {
  readonly column: number;
  readonly minute: number;
}

export type Place =
  | { readonly kind: "appointment"; readonly appointment: DayAppointment }
  | { readonly kind: "block"; readonly reason: string; readonly until: number }
  | { readonly kind: "free" | "past"; readonly until: number }
  | { readonly kind: "off"; readonly until: number };

/** A cancelled visit gave its time back: it keeps only two steps to stand on. */
const cancelledMinutes = 10;

const covers = (span: DayHours, minute: number) => span.fromMinute <= minute && minute < span.untilMinute;
const span = (a: DayAppointment): DayHours =>
  a.state === "cancelled" ? { fromMinute: a.fromMinute, untilMinute: a.fromMinute + cancelledMinutes } : a;

/** The visits of a column that are seen: a cancelled one hides where its time was given to someone else. */
export function shownAppointments(column: DayColumn): DayAppointment[] {
  const live = column.appointments.filter((a) => a.state !== "cancelled");
  const isHidden = (a: DayAppointment) =>
    a.state === "cancelled" &&
    live.some((b) => b.fromMinute < span(a).untilMinute && a.fromMinute < b.untilMinute);
  return column.appointments.filter((a) => !isHidden(a));
}

/** Where the next thing of a column begins after a minute, or the end of the day. */
function nextStart(column: DayColumn, minute: number, end: number): number {
  const starts = [...shownAppointments(column), ...column.blocks, ...column.hours].map((s) => s.fromMinute);
  return Math.min(end, ...starts.filter((from) => from > minute));
}

/** What is under the cursor. */
export function placeAt(day: DiaryDayView, cursor: Cursor): Place {
  const column = day.columns[cursor.column];
  const end = day.bounds.untilMinute;
  if (!column) return { kind: "off", until: end };
  const here = shownAppointments(column).filter((a) => covers(span(a), cursor.minute));
  const appointment = here.find((a) => a.state !== "cancelled") ?? here[0];
  if (appointment) return { kind: "appointment", appointment };
  const block = column.blocks.find((b) => covers(b, cursor.minute));
  if (block) return { kind: "block", reason: block.reason, until: block.untilMinute };
  const free = column.free.find((f) => covers(f, cursor.minute));
  if (free) return { kind: "free", until: Math.min(free.untilMinute, nextStart(column, cursor.minute, end)) };
  const works = column.hours.find((h) => covers(h, cursor.minute));
  const until = nextStart(column, cursor.minute, works?.untilMinute ?? end);
  return { kind: works ? "past" : "off", until };
}

/** The cursor on the start of the visit that it fell into, or where it is. */
function settle(day: DiaryDayView, cursor: Cursor): Cursor {
  const minute = Math.max(
    day.bounds.fromMinute,
    Math.min(cursor.minute, day.bounds.untilMinute - stepMinutes),
  );
  const column = Math.max(0, Math.min(cursor.column, day.columns.length - 1));
  const place = placeAt(day, { column, minute });
  return { column, minute: place.kind === "appointment" ? place.appointment.fromMinute : minute };
}

function below(day: DiaryDayView, cursor: Cursor): number {
  const place = placeAt(day, cursor);
  return place.kind === "appointment" ? span(place.appointment).untilMinute : cursor.minute + stepMinutes;
}

function nextAppointment(day: DiaryDayView, cursor: Cursor, direction: 1 | -1): number {
  const column = day.columns[cursor.column];
  const starts = column ? shownAppointments(column).map((a) => a.fromMinute) : [];
  const ahead = starts.filter((m) => (m - cursor.minute) * direction > 0);
  if (ahead.length === 0) return cursor.minute;
  return direction === 1 ? Math.min(...ahead) : Math.max(...ahead);
}

/**
 * Where a key leads. Arrows move by five minutes, or past a whole visit, and to the columns beside; with Ctrl to the
 * next visit up or down; Page keys by an hour; Home and End to the ends of the day. Null for any other key.
 */
export function moveCursor(day: DiaryDayView, cursor: Cursor, key: string, ctrl: boolean): Cursor | null {
  const to = (minute: number, column = cursor.column) => settle(day, { column, minute });
  switch (key) {
    case "ArrowDown":
      return to(ctrl ? nextAppointment(day, cursor, 1) : below(day, cursor));
    case "ArrowUp":
      return to(ctrl ? nextAppointment(day, cursor, -1) : cursor.minute - stepMinutes);
    case "ArrowLeft":
      return to(cursor.minute, cursor.column - 1);
    case "ArrowRight":
      return to(cursor.minute, cursor.column + 1);
    case "PageDown":
      return to(cursor.minute + 60);
    case "PageUp":
      return to(cursor.minute - 60);
    case "Home":
      return to(day.bounds.fromMinute, ctrl ? 0 : cursor.column);
    case "End":
      return to(day.bounds.untilMinute, ctrl ? day.columns.length - 1 : cursor.column);
    default:
      return null;
  }
}
