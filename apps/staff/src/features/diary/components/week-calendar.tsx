"use client";
import "react-big-calendar/lib/css/react-big-calendar.css";
import type { TherapistWeekView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { DateTime, Settings } from "luxon";
import { useMemo, useRef } from "react";
import { Calendar, luxonLocalizer } from "react-big-calendar";
import { AppointmentStateMark, appointmentStateLook } from "@/components/appointment-state-mark";
import { usePlainRoles } from "../hooks/use-plain-roles";
import { clock } from "../minute-words";
import { isWorked, type WeekEvent, weekEvents } from "../week-events";

export interface WeekCalendarProps {
  week: TherapistWeekView;
  today: string;
  onOpen: (visit: { id: string; siteId: string }, day: string) => void;
}

const formats = {
  timeGutterFormat: "HH:mm",
  dayFormat: "ccc d LLL",
  eventTimeRangeFormat: () => "",
};

function spokenVisit(event: WeekEvent): string {
  if (!event.visit) return event.title;
  const { fromMinute, untilMinute, serviceName, roomName, state } = event.visit;
  return `${titleDate(event.day)}, ${clock(fromMinute)} to ${clock(untilMinute)}, ${event.title}, ${serviceName}, ${roomName}, ${appointmentStateLook(state).label}`;
}

function Visit({ event }: { event: WeekEvent }) {
  if (!event.visit) return <span className="reason">{event.title}</span>;
  return (
    <div className="timeblock" data-edge={appointmentStateLook(event.visit.state).edge}>
      <span className="vh">{spokenVisit(event)}</span>
      <span aria-hidden="true">
        <b>{event.title}</b>
        <AppointmentStateMark code={event.visit.state} bare />
      </span>
    </div>
  );
}

/** The week drawn by react-big-calendar, by the site's clock whatever the browser's zone is. */
export function WeekCalendar({ week, today, onOpen }: WeekCalendarProps) {
  const box = useRef<HTMLDivElement>(null);
  usePlainRoles(box);
  const { visits, blocks } = useMemo(() => weekEvents(week), [week]);
  const localizer = useMemo(() => {
    // The library asks luxon for its zone and knows no other way to be told.
    Settings.defaultZone = week.zone;
    return luxonLocalizer(DateTime, { firstDayOfWeek: 1 });
  }, [week.zone]);
  const at = (day: string, minute: number) =>
    DateTime.fromISO(day, { zone: week.zone })
      .set({ hour: Math.floor(minute / 60), minute: minute % 60 })
      .toJSDate();
  const monday = week.days[0]?.day ?? today;
  const minuteIn = (date: Date) => {
    const local = DateTime.fromJSDate(date, { zone: week.zone });
    return { day: local.toISODate(), minute: local.hour * 60 + local.minute };
  };
  const open = (event: WeekEvent) => event.visit && onOpen(event.visit, event.day);
  return (
    <div ref={box} className="weekcalendar">
      <Calendar<WeekEvent>
        localizer={localizer}
        culture="en-GB"
        formats={formats}
        getNow={() => DateTime.local({ zone: week.zone }).toJSDate()}
        view="week"
        views={["week"]}
        toolbar={false}
        drilldownView={null}
        date={at(monday, 720)}
        onView={() => {}}
        onNavigate={() => {}}
        events={visits}
        backgroundEvents={blocks}
        components={{ event: Visit }}
        tooltipAccessor={null}
        min={at(monday, week.bounds.fromMinute)}
        max={at(monday, Math.min(week.bounds.untilMinute, 1439))}
        scrollToTime={at(monday, week.bounds.fromMinute)}
        step={15}
        timeslots={4}
        dayLayoutAlgorithm="no-overlap"
        onSelectEvent={open}
        onKeyPressEvent={(event, key) => (key as unknown as KeyboardEvent).key === "Enter" && open(event)}
        slotPropGetter={(date) => {
          const { day, minute } = minuteIn(date);
          return isWorked(
            week.days.find((one) => one.day === day),
            minute,
          )
            ? {}
            : { className: "offhours" };
        }}
      />
    </div>
  );
}
