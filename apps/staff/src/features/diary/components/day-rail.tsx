import type { DiaryDayView } from "@withy/contracts/diary";
import { pixelsPerMinute } from "../day-cursor";
import { clock } from "../minute-words";

/** Where a minute stands, in pixels below the top of the grid. */
export function top(minute: number, day: DiaryDayView): number {
  return (minute - day.bounds.fromMinute) * pixelsPerMinute;
}

function minutesEvery(step: number, day: DiaryDayView): number[] {
  const first = Math.ceil(day.bounds.fromMinute / step) * step;
  const count = Math.max(0, Math.floor((day.bounds.untilMinute - first) / step) + 1);
  return Array.from({ length: count }, (_, i) => first + i * step);
}

/** The gutter of the day: hours, quarters and their ticks. */
export function DayRail({ day }: { day: DiaryDayView }) {
  return (
    <div className="dayrail" aria-hidden="true">
      {minutesEvery(15, day).map((minute) => (
        <span
          key={minute}
          className={minute % 60 === 0 ? "hour num" : "quarter num"}
          style={{ top: top(minute, day) }}
        >
          {minute % 60 === 0 ? clock(minute) : minute % 60}
        </span>
      ))}
      {minutesEvery(5, day).map((minute) => (
        <i
          key={minute}
          data-size={minute % 60 === 0 ? "hour" : minute % 15 === 0 ? "quarter" : undefined}
          style={{ top: top(minute, day) }}
        />
      ))}
    </div>
  );
}

/** Ruled paper under the visits: hours worked, blocks and hour lines. */
export function DayLanes({ day, now }: { day: DiaryDayView; now: number | null }) {
  return (
    <div className="daylanes" aria-hidden="true">
      {day.columns.map((column) => (
        <div key={`${column.siteId} ${column.id}`} className="daylane">
          {column.hours.map((hours) => (
            <div
              key={hours.fromMinute}
              className="works"
              style={place(hours.fromMinute, hours.untilMinute, day)}
            />
          ))}
          {column.blocks.map((block) => (
            <div
              key={`${block.kind} ${block.fromMinute}`}
              className="dayblock"
              data-kind={block.kind}
              style={place(block.fromMinute, block.untilMinute, day)}
            >
              <span className="reason">{block.reason}</span>
            </div>
          ))}
        </div>
      ))}
      {minutesEvery(60, day).map((minute) => (
        <div key={minute} className="dayhour" style={{ top: top(minute, day) }} />
      ))}
      {now !== null && <div className="daynow" style={{ top: top(now, day) }} />}
      {now !== null && <div className="daynow-over" style={{ top: top(now, day) }} />}
    </div>
  );
}

export function place(fromMinute: number, untilMinute: number, day: DiaryDayView) {
  return { top: top(fromMinute, day), height: (untilMinute - fromMinute) * pixelsPerMinute };
}
