import type { DayAppointment, DiaryDayView } from "@withy/contracts/diary";
import { type PointerEvent as ReactPointerEvent, type RefObject, useRef, useState } from "react";
import { type Cursor, pixelsPerMinute, stepMinutes } from "../day-cursor";

export interface Drag {
  readonly appointment: DayAppointment;
  readonly to: Cursor;
}

/** A press that moves less than this is a click. */
const threshold = 5;

/** Where in the day a point of the window lies. */
function cursorAt(x: number, y: number, lanes: DOMRect, day: DiaryDayView): Cursor {
  const column = Math.floor(((x - lanes.left) / lanes.width) * day.columns.length);
  const minute = day.bounds.fromMinute + (y - lanes.top) / pixelsPerMinute;
  return {
    column: Math.max(0, Math.min(column, day.columns.length - 1)),
    minute: Math.max(
      day.bounds.fromMinute,
      Math.min(Math.round(minute / stepMinutes) * stepMinutes, day.bounds.untilMinute - stepMinutes),
    ),
  };
}

/** Dragging a visit with the mouse to another time or column. The Move dialog does the same without it. */
export function useDayDrag(
  lanes: RefObject<HTMLElement | null>,
  day: DiaryDayView,
  onDrop: (drag: Drag) => void,
) {
  const [drag, setDrag] = useState<Drag | null>(null);
  const wasDragged = useRef(false);

  const start = (event: ReactPointerEvent<HTMLDivElement>, appointment: DayAppointment) => {
    const box = lanes.current;
    if (event.button !== 0 || event.pointerType !== "mouse" || !box) return;
    const from = { x: event.clientX, y: event.clientY };
    const grip = event.clientY - event.currentTarget.getBoundingClientRect().top;
    let last: Drag | null = null;
    wasDragged.current = false;
    const move = (now: PointerEvent) => {
      if (!last && Math.hypot(now.clientX - from.x, now.clientY - from.y) < threshold) return;
      last = { appointment, to: cursorAt(now.clientX, now.clientY - grip, box.getBoundingClientRect(), day) };
      wasDragged.current = true;
      setDrag(last);
    };
    const stop = (drop: boolean) => {
      window.removeEventListener("pointermove", move);
      window.removeEventListener("pointerup", release);
      window.removeEventListener("keydown", leave);
      setDrag(null);
      if (drop && last) onDrop(last);
    };
    const release = () => stop(true);
    const leave = (key: KeyboardEvent) => key.key === "Escape" && stop(false);
    window.addEventListener("pointermove", move);
    window.addEventListener("pointerup", release);
    window.addEventListener("keydown", leave);
  };

  /** The click that ends a drag opens nothing. */
  const isClick = () => !wasDragged.current;
  return { drag, start, isClick };
}
