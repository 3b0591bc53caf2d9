import ICAL from "ical.js";
import { describe, expect, it } from "vitest";
import { appointmentCalendar, type CalendarAppointment } from "./appointment-calendar";

const booked: CalendarAppointment = {
  id: "01890000-0000-7000-8000-000000000001",
  version: 1,
  startsAt: new Date("2026-12-08T10:15:00Z"),
  endsAt: new Date("2026-12-08T11:00:00Z"),
  practice: "Marram Physiotherapy; Easterhaven",
  practiceEmail: "hello@marram.example",
  place: "Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA",
  withWhom: "With Siân Ŵyn, physiotherapist",
  phone: "01632 960 110",
  attendee: { name: 'Zoë, "Zo" O’Neill', email: "zoe@post.example" },
  at: new Date("2026-12-01T10:42:00Z"),
};

/** Read back by another library than the one that wrote it. */
function read(content: string) {
  const root = new ICAL.Component(ICAL.parse(content) as unknown[]);
  const vevent = root.getFirstSubcomponent("vevent");
  if (!vevent) throw new Error("no event in the file");
  return { root, vevent, event: new ICAL.Event(vevent) };
}

describe("the calendar file of an appointment", () => {
  it("is a request in UTC with the words intact", () => {
    const { root, vevent, event } = read(appointmentCalendar(booked, false).content);
    expect(root.getFirstPropertyValue("method")).toBe("REQUEST");
    expect(event.startDate.toString()).toBe("2026-12-08T10:15:00Z");
    expect(event.endDate.toString()).toBe("2026-12-08T11:00:00Z");
    expect(event.summary).toBe("Appointment at Marram Physiotherapy; Easterhaven");
    expect(event.location).toBe(booked.place);
    expect(event.description).toBe("With Siân Ŵyn, physiotherapist\nTo change it, ring 01632 960 110.");
    expect(vevent.getFirstPropertyValue("status")).toBe("CONFIRMED");
    expect(String(vevent.getFirstPropertyValue("attendee")).toLowerCase()).toBe("mailto:zoe@post.example");
    expect(String(vevent.getFirstPropertyValue("organizer")).toLowerCase()).toBe(
      "mailto:hello@marram.example",
    );
  });

  it("keeps one identity through a move and a cancellation, with a rising sequence", () => {
    const files = [
      appointmentCalendar(booked, false),
      appointmentCalendar({ ...booked, version: 2, startsAt: new Date("2026-12-09T09:00:00Z") }, false),
      appointmentCalendar({ ...booked, version: 3 }, true),
    ].map((file) => read(file.content));
    expect(new Set(files.map(({ event }) => event.uid)).size).toBe(1);
    expect(files.map(({ event }) => event.sequence)).toEqual([1, 2, 3]);
    expect(files.map(({ root }) => root.getFirstPropertyValue("method"))).toEqual([
      "REQUEST",
      "REQUEST",
      "CANCEL",
    ]);
    expect(files[2]?.vevent.getFirstPropertyValue("status")).toBe("CANCELLED");
  });

  it("cannot be made to carry lines of its own by a name", () => {
    const { content } = appointmentCalendar(
      { ...booked, practice: "A\r\nATTENDEE:mailto:x@y.example\r\nX" },
      false,
    );
    const { vevent } = read(content);
    expect(vevent.getAllProperties("attendee").length).toBe(1);
  });

  it.each([
    ["before the clocks go back", "2026-10-24T08:00:00Z"],
    ["after", "2026-10-26T09:00:00Z"],
  ])("gives the instant itself %s", (_, startsAt) => {
    const { event } = read(appointmentCalendar({ ...booked, startsAt: new Date(startsAt) }, false).content);
    expect(event.startDate.toJSDate().toISOString()).toBe(new Date(startsAt).toISOString());
  });
});
