import ical, {
  ICalAttendeeRole,
  ICalAttendeeStatus,
  type ICalCalendar,
  ICalCalendarMethod,
  ICalEventStatus,
} from "ical-generator";

const prodId = { company: "Withy", product: "Withy", language: "EN" };

export interface CalendarAppointment {
  readonly id: string;
  /** Rises with every change of the appointment, so that a calendar knows which file is the later one. */
  readonly version: number;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly practice: string;
  readonly practiceEmail: string;
  /** Site and address in one line. */
  readonly place: string;
  /** "with Nia Prosser, physiotherapist"; never what it is for. */
  readonly withWhom: string;
  readonly phone: string;
  readonly attendee: { readonly name: string; readonly email: string };
  /** When the file is made. */
  readonly at: Date;
}

export interface CalendarFile {
  readonly content: string;
  readonly method: "REQUEST" | "CANCEL";
}

/**
 * The calendar file for an e-mail. A booking and a move are a REQUEST, a cancellation a CANCEL of the same event
 * (RFC 5546); times are in UTC, so a reader's own zone shows them right. Nothing in it says what the visit is for.
 */
export function appointmentCalendar(appointment: CalendarAppointment, isCancelled: boolean): CalendarFile {
  const method = isCancelled ? ICalCalendarMethod.CANCEL : ICalCalendarMethod.REQUEST;
  const calendar = ical({ method, prodId });
  addEvent(calendar, appointment, isCancelled);
  return { content: calendar.toString(), method: isCancelled ? "CANCEL" : "REQUEST" };
}

/**
 * One file for several appointments. An invitation may speak of one event only (RFC 5546), so these are published;
 * each keeps the identity under which a later move or cancellation of it alone is told.
 */
export function publishedCalendar(
  appointments: readonly CalendarAppointment[],
  isCancelled: boolean,
): string {
  const calendar = ical({ method: ICalCalendarMethod.PUBLISH, prodId });
  for (const appointment of appointments) addEvent(calendar, appointment, isCancelled);
  return calendar.toString();
}

function addEvent(calendar: ICalCalendar, appointment: CalendarAppointment, isCancelled: boolean): void {
  const event = calendar.createEvent({
    id: `appointment-${appointment.id}@withy`,
    sequence: appointment.version,
    stamp: appointment.at,
    start: appointment.startsAt,
    end: appointment.endsAt,
    summary: `Appointment at ${appointment.practice}`,
    description: `${capital(appointment.withWhom)}\nTo change it, ring ${appointment.phone}.`,
    location: appointment.place,
    status: isCancelled ? ICalEventStatus.CANCELLED : ICalEventStatus.CONFIRMED,
    organizer: { name: appointment.practice, email: appointment.practiceEmail },
  });
  event.createAttendee({
    name: appointment.attendee.name,
    email: appointment.attendee.email,
    rsvp: false,
    role: ICalAttendeeRole.REQ,
    status: ICalAttendeeStatus.ACCEPTED,
  });
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
