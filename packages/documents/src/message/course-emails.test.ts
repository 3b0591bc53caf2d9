import { describe, expect, it } from "vitest";
import { type CourseMessage, courseBooked, courseCancelled, courseMoved } from "./course-emails";

const at = new Date("2027-03-01T09:00:00Z");
const appointment = (id: string, startsAt: string, place = "Saltgate, 4 Saltgate Row") => ({
  ...{
    id,
    version: 2,
    startsAt: new Date(startsAt),
    endsAt: new Date(new Date(startsAt).getTime() + 1_800_000),
  },
  ...{ practiceEmail: "desk@marram.example", place, withWhom: "with Nia Prosser, physiotherapist", at },
  attendee: { name: "Perran Oake", email: "perran.oake@post.example" },
});

const message: CourseMessage = {
  appointments: [appointment("a", "2027-03-23T09:00:00Z"), appointment("b", "2027-03-30T08:00:00Z")],
  sender: { practice: "Marram Physiotherapy", contactLines: ["01632 960111"] },
  ...{ phone: "01632 960111", zone: "Europe/London", greetingName: "Perran", noticeHours: 24 },
};

describe("one message about the visits of a course", () => {
  it("names every visit by the site's clock, and the place once", () => {
    const { subject, text, attachments } = courseBooked(message);
    expect(subject).toBe("Your 2 appointments at Marram Physiotherapy");
    expect(text).toContain("1: Tuesday 23 March 2027 at 9am");
    expect(text).toContain("2: Tuesday 30 March 2027 at 9am");
    expect(text.match(/Saltgate Row/g)).toHaveLength(1);
    expect(attachments).toMatchObject([{ filename: "appointments.ics" }]);
  });

  it("carries a calendar with each visit under the name that a later change of it alone has", () => {
    const file = String(courseMoved(message).attachments[0]?.content);
    expect(file).toContain("METHOD:PUBLISH");
    expect(file.match(/BEGIN:VEVENT/g)).toHaveLength(2);
    expect(file).toContain("UID:appointment-a@withy");
    expect(file).toContain("DTSTART:20270330T080000Z");
    expect(file.match(/SEQUENCE:2/g)).toHaveLength(2);
  });

  it("takes them out of the calendar when they are cancelled", () => {
    const { text, attachments } = courseCancelled(message);
    expect(text).toContain("Your 2 appointments at Marram Physiotherapy are cancelled.");
    expect(String(attachments[0]?.content).match(/STATUS:CANCELLED/g)).toHaveLength(2);
  });

  it("says the place with each visit where they differ", () => {
    const [first] = message.appointments;
    const other = appointment("c", "2027-04-06T08:00:00Z", "Tollhouse Lane, 9 Tollhouse Lane");
    const { text } = courseBooked({ ...message, appointments: first ? [first, other] : [] });
    expect(text).toContain("at 9am, with Nia Prosser, physiotherapist, Tollhouse Lane, 9 Tollhouse Lane");
  });
});
