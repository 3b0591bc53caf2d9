import type { TherapistWeekView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { Line } from "@withy/ui/line";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { AppointmentStateMark } from "@/components/appointment-state-mark";
import { clock } from "../minute-words";

/** The week as a list by day, for a narrow window and for paper. */
export function WeekList({ week }: { week: TherapistWeekView }) {
  return (
    <div className="weeklist">
      {week.days.map((day) => (
        <section key={day.day} aria-label={titleDate(day.day)}>
          <div className="weeklisthead">
            <SectionHead
              title={titleDate(day.day)}
              aside={day.closedReason ?? day.sites.map((site) => site.name).join(", ")}
            />
          </div>
          {day.appointments.map((visit) => (
            <Line key={visit.id} gutter={clock(visit.fromMinute)} tick className="weekvisit">
              <AppointmentStateMark code={visit.state} />
              <Link href={`/diary?day=${day.day}&site=${visit.siteId}&at=${visit.id}`}>
                {visit.patientName}
              </Link>
              <span className="soft small">
                {visit.serviceName}, {visit.roomName}
              </span>
            </Line>
          ))}
          {day.appointments.length === 0 && <Line className="soft">No visits</Line>}
        </section>
      ))}
    </div>
  );
}
