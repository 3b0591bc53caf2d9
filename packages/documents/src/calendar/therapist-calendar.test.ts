import fc from "fast-check";
import ICAL from "ical.js";
import { describe, expect, it } from "vitest";
import { type FeedEvent, therapistCalendar } from "./therapist-calendar";

const event: FeedEvent = {
  id: "01890000-0000-7000-8000-000000000001",
  kind: "appointment",
  version: 3,
  startsAt: new Date("2026-10-25T00:30:00Z"),
  endsAt: new Date("2026-10-25T01:15:00Z"),
  changedAt: new Date("2026-10-01T10:42:00Z"),
  isCancelled: false,
  summary: "P. O.",
  place: "Saltgate, Room 1",
};

/** Read back by another library than the one that wrote it. */
function read(events: readonly FeedEvent[]) {
  const content = therapistCalendar({ name: "Ana Novak, Marram Physiotherapy", events });
  const root = new ICAL.Component(ICAL.parse(content) as unknown[]);
  return { content, root, vevents: root.getAllSubcomponents("vevent") };
}

describe("a therapist's calendar", () => {
  it("gives instants in UTC, one identity, the version as its sequence, and the last change as its stamp", () => {
    const { root, vevents } = read([event]);
    expect(root.getFirstPropertyValue("version")).toBe("2.0");
    expect(root.getFirstPropertyValue("method")).toBeNull();
    const [vevent] = vevents;
    if (!vevent) throw new Error("no event");
    const one = new ICAL.Event(vevent);
    expect([one.startDate.toString(), one.endDate.toString()]).toEqual([
      "2026-10-25T00:30:00Z",
      "2026-10-25T01:15:00Z",
    ]);
    expect([one.uid, one.sequence]).toEqual([`appointment-${event.id}@withy`, 3]);
    expect(String(vevent.getFirstPropertyValue("dtstamp"))).toBe("2026-10-01T10:42:00Z");
    expect(vevent.getFirstPropertyValue("status")).toBe("CONFIRMED");
  });

  it("tells a cancelled visit as cancelled under the same identity", () => {
    const { vevents } = read([{ ...event, version: 4, isCancelled: true }]);
    expect(vevents[0]?.getFirstPropertyValue("status")).toBe("CANCELLED");
    expect(vevents[0]?.getFirstPropertyValue("uid")).toBe(`appointment-${event.id}@withy`);
  });

  it("is the same to the byte for the same diary, so that its version can be told from it", () => {
    expect(read([event]).content).toBe(read([event]).content);
  });

  it("is sound with no visit at all", () => expect(read([]).vevents).toEqual([]));

  it("whatever a name holds, it stays one summary of one event", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme", minLength: 1, maxLength: 80 }), (name) => {
        const { vevents } = read([{ ...event, summary: name }]);
        expect(vevents.length).toBe(1);
        expect(vevents[0]?.getAllProperties("summary").length).toBe(1);
        expect(vevents[0]?.getAllProperties("attendee")).toEqual([]);
      }),
      { numRuns: 200 },
    );
  });
});
