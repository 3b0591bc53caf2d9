// biome-ignore-all lint/a11y/useSemanticElements: cells that stand at their minute cannot be rows of a table
import type { DayColumn, DiaryDayView } from "@withy/contracts/diary";
import { Button } from "@withy/ui/button";
import { shortClock, span } from "../minute-words";

function hoursWords(column: DayColumn, isOver: boolean): string {
  const first = column.hours[0];
  const last = column.hours.at(-1);
  if (!first || !last) return column.blocks.find((b) => b.kind === "leave")?.reason ?? "not here today";
  const hours = `${shortClock(first.fromMinute)} to ${shortClock(last.untilMinute)}`;
  if (isOver) return hours;
  const free = column.freeMinutes > 0 ? `${span(column.freeMinutes)} free` : "full";
  return `${hours}, ${free}`;
}

/** Names of the columns, with their hours and what is still free. */
export function DayHead({
  day,
  today,
  onColumns,
}: {
  day: DiaryDayView;
  today: string;
  onColumns: (by: "therapist" | "room") => void;
}) {
  const other = day.by === "therapist" ? "room" : "therapist";
  return (
    // biome-ignore lint/a11y/useFocusableInteractive: rows take no focus
    <div role="row" className="dayhead" aria-rowindex={1}>
      <div role="columnheader" tabIndex={-1} className="gut" aria-colindex={1}>
        <span>Columns are</span>
        <Button
          kind="plain"
          size="small"
          aria-label={`Columns are ${day.by}s. Show ${other}s instead`}
          onClick={() => onColumns(other)}
        >
          {day.by}s
        </Button>
      </div>
      <div className="names">
        {day.columns.map((column, index) => (
          <div
            key={`${column.siteId} ${column.id}`}
            role="columnheader"
            tabIndex={-1}
            aria-colindex={index + 2}
          >
            <b>{column.name}</b>
            <span className="soft">
              {day.sites.length > 1 && `${day.sites.find((site) => site.id === column.siteId)?.name ?? ""}, `}
              {hoursWords(column, day.day < today)}
            </span>
          </div>
        ))}
      </div>
    </div>
  );
}
