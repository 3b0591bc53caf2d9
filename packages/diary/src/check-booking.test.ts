import { describe, expect, it } from "vitest";
import { type BookingFacts, checkBooking, readStart } from "./check-booking";

const at = (t: string): Date => new Date(`2026-12-01T${t}:00Z`);
const facts: BookingFacts = {
  startsAt: at("10:15"),
  durationMinutes: 30,
  cleanDownMinutes: 5,
  now: at("09:42"),
  site: { id: "saltgate", name: "Saltgate", zone: "Europe/London" },
  room: { name: "Reed", siteId: "saltgate", kind: "treatment", equipment: ["hoist"], isStepFree: false },
  service: { name: "Follow-up", roomKind: "treatment", needsEquipment: [], isActive: true },
  therapist: { name: "Nia Prosser", givesService: true, isActive: true },
  working: [
    { from: at("08:00").getTime(), to: at("12:30").getTime() },
    { from: at("13:15").getTime(), to: at("18:00").getTime() },
  ],
  blocked: [{ from: at("16:00").getTime(), to: at("17:00").getTime(), reason: "Supervision" }],
};

describe("checking a booking", () => {
  it.each<[string, Partial<BookingFacts>, string | null]>([
    ["a free time in working hours", {}, null],
    ["a start off the grid", { startsAt: at("10:17") }, "off-grid"],
    ["an odd length", { durationMinutes: 33 }, "odd-length"],
    ["no length", { durationMinutes: 0 }, "odd-length"],
    ["an odd clean-down", { cleanDownMinutes: 3 }, "odd-length"],
    ["no clean-down", { cleanDownMinutes: 0 }, null],
    ["more than a working day", { durationMinutes: 485 }, "too-long"],
    ["five minutes ago", { startsAt: at("09:35") }, "in-the-past"],
    ["this very minute", { now: at("10:15") }, null],
    ["just begun, with grace", { startsAt: at("09:30"), graceMinutes: 15 }, null],
    ["a room elsewhere", { room: { ...facts.room, name: "Bay 2", siteId: "tollhouse" } }, "room-elsewhere"],
    ["the wrong kind of room", { room: { ...facts.room, name: "Gym", kind: "gym" } }, "wrong-room"],
    ["equipment that is there", { service: { ...facts.service, needsEquipment: ["hoist"] } }, null],
    [
      "equipment that is not",
      { service: { ...facts.service, needsEquipment: ["hoist", "treadmill"] } },
      "wrong-room",
    ],
    ["a step on the way", { needsStepFree: true }, "wrong-room"],
    ["no step on the way", { needsStepFree: true, room: { ...facts.room, isStepFree: true } }, null],
    ["a service that ended", { service: { ...facts.service, isActive: false } }, "service-ended"],
    [
      "a therapist without the service",
      { therapist: { ...facts.therapist, givesService: false } },
      "wrong-therapist",
    ],
    ["a therapist who left", { therapist: { ...facts.therapist, isActive: false } }, "wrong-therapist"],
    ["after work", { startsAt: at("18:00") }, "outside-hours"],
    ["into lunch", { startsAt: at("12:15") }, "outside-hours"],
    ["up to lunch, cleaning after", { startsAt: at("12:00") }, null],
    ["into lunch with a reason", { startsAt: at("12:15"), overrideReason: "Agreed with Nia" }, null],
    ["a blank reason", { startsAt: at("12:15"), overrideReason: "  " }, "outside-hours"],
    ["into a block", { startsAt: at("15:45") }, "blocked"],
    ["into a block with a reason", { startsAt: at("15:45"), overrideReason: "Supervision is off" }, null],
    ["a reason does not mend the past", { startsAt: at("09:00"), overrideReason: "Forgot" }, "in-the-past"],
  ])("%s", (_name, change, kind) => {
    expect(checkBooking({ ...facts, ...change })?.kind ?? null).toBe(kind);
  });

  it("says what to do", () => {
    const refused = checkBooking({ ...facts, startsAt: at("18:00") });
    expect(refused?.message).toBe(
      "Nia Prosser does not work at Saltgate at that time on Tuesday 1 December 2026. Choose another time, or say why it is booked all the same.",
    );
  });
});

describe("the way between two sites", () => {
  const away = (from: string, to: string) => ({
    ...{ from: at(from).getTime(), to: at(to).getTime() },
    ...{ siteName: "Tollhouse Lane", minutesThere: 20, minutesBack: 25 },
  });
  it.each<[string, Partial<BookingFacts>, string | null]>([
    ["just arrives", { away: [away("09:00", "09:50")] }, null],
    ["arrives too late", { away: [away("09:00", "09:55")] }, "too-far-apart"],
    ["cleans and just leaves", { away: [away("11:10", "12:00")] }, null],
    ["has to leave before the cleaning is done", { away: [away("11:05", "12:00")] }, "too-far-apart"],
    ["is there already, which the claims tell", { away: [away("10:00", "11:00")] }, null],
    ["with a reason", { away: [away("09:00", "09:55")], overrideReason: "By car today" }, null],
  ])("%s", (_name, change, kind) => expect(checkBooking({ ...facts, ...change })?.kind ?? null).toBe(kind));

  it("says how long it takes and when there is time", () => {
    expect(checkBooking({ ...facts, away: [away("09:00", "09:55")] })?.message).toBe(
      "Nia Prosser is at Tollhouse Lane until 09:55, and the way to Saltgate takes 25 minutes. Choose 10:20 or later, or say why it is booked all the same.",
    );
  });
});

describe("a closed day", () => {
  it("says why it is closed", () => {
    const refused = checkBooking({ ...facts, working: [], closedReason: "Boiler repair" });
    expect(refused?.kind).toBe("outside-hours");
    expect(refused?.message).toContain("Saltgate is closed on Tuesday 1 December 2026: Boiler repair.");
  });
});

describe("reading a start by the site's clock", () => {
  it.each([
    ["2026-10-20", "09:00", "2026-10-20T08:00:00.000Z"],
    ["2026-10-27", "09:00", "2026-10-27T09:00:00.000Z"],
    ["2026-10-25", "01:30", "2026-10-25T00:30:00.000Z"],
  ])("%s %s", (day, time, expected) => {
    expect((readStart(day, time, "Europe/London") as Date).toISOString()).toBe(expected);
  });

  it("refuses a time that does not happen", () => {
    expect(readStart("2027-03-28", "01:30", "Europe/London")).toMatchObject({
      kind: "clock-gap",
      field: "startsAt",
    });
  });
});
