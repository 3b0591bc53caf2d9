import type { DiaryDayView, HeldTime } from "@withy/contracts/diary";
import { clock } from "../minute-words";
import { place } from "./day-rail";

const firstName = (name: string): string => name.split(" ")[0] ?? name;

/** Times that other people are booking now, hatched in their lanes. */
export function HeldLanes({ day, held }: { day: DiaryDayView; held: readonly HeldTime[] }) {
  return day.columns.map((column, index) =>
    held
      .filter((one) => one.day === day.day && one.therapistId === column.id && one.siteId === column.siteId)
      .map((one) => (
        <div
          key={`${one.byName} ${one.fromMinute}`}
          className="dayheld"
          aria-hidden="true"
          style={{
            ...place(one.fromMinute, one.untilMinute, day),
            left: `calc(${index} * 100% / ${day.columns.length})`,
            width: `calc(100% / ${day.columns.length})`,
          }}
        >
          <span className="reason">{firstName(one.byName)} is booking</span>
        </div>
      )),
  );
}

/** The same in words, for whoever hears the page. */
export function HeldWords({ day, held }: { day: DiaryDayView; held: readonly HeldTime[] }) {
  const here = held.filter((one) => one.day === day.day);
  return (
    <div className="vh" role="status">
      {here.map((one) => {
        const column = day.columns.find(({ id }) => id === one.therapistId);
        return (
          <p key={`${one.byName} ${one.fromMinute}`}>
            {one.byName} is booking {clock(one.fromMinute)} to {clock(one.untilMinute)}
            {column ? ` with ${column.name}` : ""}.
          </p>
        );
      })}
    </div>
  );
}
