import { longDate, proseTime } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { appointmentCalendar, type CalendarAppointment } from "../calendar/appointment-calendar";
import { type EmailContent, type EmailSender, type RenderedEmail, renderEmail } from "./email";

export interface AppointmentMessage {
  readonly appointment: Omit<CalendarAppointment, "practice" | "phone">;
  readonly sender: EmailSender;
  readonly phone: string;
  /** The site's zone: times are always the site's. */
  readonly zone: string;
  /** How the patient likes to be called. */
  readonly greetingName: string;
  readonly noticeHours: number;
}

/** "Tuesday 8 December 2026 at 10:15am". */
export function whenWords(at: Date, zone: string): string {
  return `${longDate(dayOf(at, zone))} at ${proseTime(timeOf(at, zone))}`;
}

function facts({ appointment, zone }: AppointmentMessage): { label: string; value: string }[] {
  return [
    { label: "When", value: whenWords(appointment.startsAt, zone) },
    { label: "Until", value: proseTime(timeOf(appointment.endsAt, zone)) },
    { label: "Where", value: appointment.place },
    { label: "With", value: appointment.withWhom.replace(/^with /i, "") },
  ];
}

function noticeLine({ noticeHours, phone }: AppointmentMessage): string {
  return `If you cannot come, please ring ${phone} at least ${noticeHours} hours before, so that someone else can have the time.`;
}

function withCalendar(
  message: AppointmentMessage,
  content: EmailContent,
  isCancelled: boolean,
): RenderedEmail {
  const { sender, phone, appointment } = message;
  const calendar = appointmentCalendar({ ...appointment, practice: sender.practice, phone }, isCancelled);
  return { ...renderEmail(content), calendar: { ...calendar, filename: "appointment.ics" } };
}

export function bookingConfirmed(message: AppointmentMessage): RenderedEmail {
  const content: EmailContent = {
    subject: `Your appointment on ${whenWords(message.appointment.startsAt, message.zone)}`,
    greeting: `Dear ${message.greetingName}`,
    paragraphs: [`Your appointment at ${message.sender.practice} is booked.`],
    facts: facts(message),
    after: [noticeLine(message), "The attached file puts the appointment in your calendar."],
    from: message.sender,
  };
  return withCalendar(message, content, false);
}

/** @param before when it was, for a reader who remembers the old time */
export function bookingMoved(message: AppointmentMessage, before: Date): RenderedEmail {
  const when = whenWords(message.appointment.startsAt, message.zone);
  // Another therapist or site at the same time: then the time is the one thing that has not changed.
  const isSameTime = before.getTime() === message.appointment.startsAt.getTime();
  const content: EmailContent = {
    subject: isSameTime
      ? `A change to your appointment on ${when}`
      : `New time for your appointment: ${when}`,
    greeting: `Dear ${message.greetingName}`,
    paragraphs: [
      isSameTime
        ? "Your appointment keeps its time. Where it is or whom you see has changed; it now stands as follows."
        : `Your appointment has a new time. Before, it was ${whenWords(before, message.zone)}.`,
    ],
    facts: facts(message),
    after: [noticeLine(message), "The attached file changes the appointment in your calendar."],
    from: message.sender,
  };
  return withCalendar(message, content, false);
}

/** A reminder comes when the notice may have run out, so it asks only for a word as soon as there is one. */
export function visitReminder(message: AppointmentMessage): RenderedEmail {
  const content: EmailContent = {
    subject: `Reminder: your appointment on ${whenWords(message.appointment.startsAt, message.zone)}`,
    greeting: `Dear ${message.greetingName}`,
    paragraphs: [`This is a reminder of your appointment at ${message.sender.practice}.`],
    facts: facts(message),
    after: [
      `If you cannot come, please ring ${message.phone} as soon as you know, so that someone else can have the time.`,
      "The attached file puts the appointment in your calendar.",
    ],
    from: message.sender,
  };
  return withCalendar(message, content, false);
}

export function bookingCancelled(message: AppointmentMessage): RenderedEmail {
  const content: EmailContent = {
    subject: `Cancelled: your appointment on ${whenWords(message.appointment.startsAt, message.zone)}`,
    greeting: `Dear ${message.greetingName}`,
    paragraphs: [
      `Your appointment on ${whenWords(message.appointment.startsAt, message.zone)} is cancelled.`,
      `To book another time, ring ${message.phone}.`,
    ],
    after: ["The attached file takes the appointment out of your calendar."],
    from: message.sender,
  };
  return withCalendar(message, content, true);
}
