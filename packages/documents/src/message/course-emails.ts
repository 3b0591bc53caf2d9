import { publishedCalendar } from "../calendar/appointment-calendar";
import { type AppointmentMessage, whenWords } from "./appointment-emails";
import { type EmailContent, type RenderedEmail, renderEmail } from "./email";

/** The visits of one act on a course, in order. Everything but the appointment is the same for all. */
export type CourseMessage = Omit<AppointmentMessage, "appointment"> & {
  readonly appointments: readonly AppointmentMessage["appointment"][];
};

const countWords = (n: number): string => (n === 1 ? "1 appointment" : `${n} appointments`);

function factsOf({ appointments, zone }: CourseMessage): { label: string; value: string }[] {
  const isOnePlace = new Set(appointments.map((a) => `${a.place} ${a.withWhom}`)).size === 1;
  const first = appointments[0];
  const visits = appointments.map((a, n) => ({
    label: String(n + 1),
    value: `${whenWords(a.startsAt, zone)}${isOnePlace ? "" : `, ${a.withWhom}, ${a.place}`}`,
  }));
  if (!isOnePlace || !first) return visits;
  const withWhom = first.withWhom.replace(/^with /i, "");
  return [...visits, { label: "Where", value: first.place }, { label: "With", value: withWhom }];
}

function withCalendar(message: CourseMessage, content: EmailContent, isCancelled: boolean): RenderedEmail {
  const { sender, phone } = message;
  const events = message.appointments.map((a) => ({ ...a, practice: sender.practice, phone }));
  const file = {
    filename: "appointments.ics",
    contentType: "text/calendar; charset=utf-8; method=PUBLISH",
    content: publishedCalendar(events, isCancelled),
  };
  return renderEmail(content, [file]);
}

function contentOf(message: CourseMessage, subject: string, says: string, after: string[]): EmailContent {
  const { greetingName, sender } = message;
  const greeting = `Dear ${greetingName}`;
  return { subject, greeting, paragraphs: [says], facts: factsOf(message), after, from: sender };
}

const noticeLine = ({ phone, noticeHours }: CourseMessage): string =>
  `If you cannot come to one of them, please ring ${phone} at least ${noticeHours} hours before, so that someone else can have the time.`;

export function courseBooked(message: CourseMessage): RenderedEmail {
  const count = countWords(message.appointments.length);
  const verb = message.appointments.length === 1 ? "is" : "are";
  const says = `Your ${count} at ${message.sender.practice} ${verb} booked.`;
  const after = [noticeLine(message), "The attached file puts them in your calendar."];
  return withCalendar(
    message,
    contentOf(message, `Your ${count} at ${message.sender.practice}`, says, after),
    false,
  );
}

export function courseMoved(message: CourseMessage): RenderedEmail {
  const count = countWords(message.appointments.length);
  const verb = message.appointments.length === 1 ? "has a new time" : "have new times";
  const says = `Your ${count} at ${message.sender.practice} ${verb}. These take the place of the earlier ones.`;
  const after = [noticeLine(message), "The attached file changes them in your calendar."];
  const subject = `New times for your ${count}`;
  return withCalendar(message, contentOf(message, subject, says, after), false);
}

export function courseCancelled(message: CourseMessage): RenderedEmail {
  const count = countWords(message.appointments.length);
  const verb = message.appointments.length === 1 ? "is" : "are";
  const says = `Your ${count} at ${message.sender.practice} ${verb} cancelled.`;
  const after = [
    `To book other times, ring ${message.phone}.`,
    "The attached file takes them out of your calendar.",
  ];
  return withCalendar(message, contentOf(message, `Cancelled: your ${count}`, says, after), true);
}
