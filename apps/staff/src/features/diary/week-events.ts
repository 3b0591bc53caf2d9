import type { DayAppointment, TherapistWeekView, WeekDay } from "@withy/contracts/diary";
import { instantAt } from "@withy/core/zoned-time";
import { clock } from "./minute-words";

export interface WeekEvent {
  readonly id: string;
  readonly title: string;
  readonly start: Date;
  readonly end: Date;
  readonly day: string;
  readonly visit: DayAppointment | null;
}

/** Everything that stands in the week: visits, and blocks in the background. */
export function weekEvents(week: TherapistWeekView): { visits: WeekEvent[]; blocks: WeekEvent[] } {
  const visits = week.days.flatMap((day) =>
    day.appointments.map((visit) => ({
      id: visit.id,
      title: visit.patientName,
      start: new Date(visit.startsAt),
      end: new Date(visit.endsAt),
      day: day.day,
      visit,
    })),
  );
  const blocks = week.days.flatMap((day) =>
    day.blocks.flatMap((block) => {
      const start = instantAt(day.day, clock(block.fromMinute), week.zone);
      const end = instantAt(day.day, clock(Math.min(block.untilMinute, 1439)), week.zone);
      if (!start || !end) return [];
      return [
        { id: `${day.day} ${block.fromMinute}`, title: block.reason, start, end, day: day.day, visit: null },
      ];
    }),
  );
  return { visits, blocks };
}

/** Whether a minute of a day is worked at any site. */
export function isWorked(day: WeekDay | undefined, minute: number): boolean {
  return (day?.sites ?? []).some((site) =>
    site.hours.some((h) => h.fromMinute <= minute && minute < h.untilMinute),
  );
}
