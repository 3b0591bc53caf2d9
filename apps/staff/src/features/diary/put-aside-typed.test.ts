import type { PutAsideItem } from "@withy/contracts/diary";
import { expect, it } from "vitest";
import { concerns, readWishes, type Wishes } from "./find-wishes";
import { asideBooking, asideFinding, bookingAside, findingAside } from "./put-aside-typed";

const patient = {
  id: "0193a1de-0000-7000-8000-000000000001",
  label: "Tamsin Roe",
  detail: "born 14 May 1971",
};

const emptyWishes = readWishes(new URLSearchParams());

/** What the server gives back of what was put aside. */
const stored = (sent: ReturnType<typeof asideBooking> | ReturnType<typeof asideFinding>): PutAsideItem => ({
  id: "item",
  kind: sent.kind,
  title: sent.title,
  patient: sent.patientId ? { id: patient.id, name: patient.label, bornOn: "1971-05-14" } : null,
  typed: sent.typed,
  time: "10:44",
  putAsideAt: "2026-12-01T10:44:00.000Z",
});

const when = {
  dayText: "Tue 8 De",
  day: null,
  timeText: "quarter past",
  siteId: "s",
  therapistId: "t",
  roomId: "",
};

it.each([
  ["with nothing chosen", { wanted: { ...when, dayText: "", timeText: "" }, patient: null, serviceId: "" }],
  ["half typed", { wanted: when, patient, serviceId: "follow-up" }],
  ["whole", { wanted: { ...when, day: "2026-12-08", timeText: "10:15" }, patient, serviceId: "follow-up" }],
])("a booking comes back as it was typed: %s", (_, form) => {
  const typed = { ...form, deskNote: "Comes by taxi", reason: "Asked for it" };
  expect(bookingAside(stored(asideBooking(typed, undefined)))).toEqual({ ...typed, asideId: "item" });
});

it("wishes come back as they were typed, with the order of what matters", () => {
  const typed: Wishes = {
    serviceId: "follow-up",
    weekdays: ["2", "4"],
    fromText: "after lunch",
    untilText: "16:00",
    earliestText: "next mon",
    earliestOn: "2026-12-07",
    therapistId: "t",
    siteIds: ["s", "u"],
    latestText: "18 dec",
    latestOn: "2026-12-18",
    windows: ["2026-12-08T10:00/12:00"],
    needs: ["step-free"],
    urgency: "soon",
    order: [...concerns].reverse(),
  };
  const sent = asideFinding(typed, patient, "Follow-up", null);
  expect(sent.title).toBe("Find a time, Follow-up, Tamsin Roe");
  expect(findingAside(stored(sent))).toEqual({ wishes: typed, patient });
});

it("an order that is not whole is the practice's own, a day that is none is none", () => {
  const item = {
    ...stored(asideFinding({ ...emptyWishes, order: ["day"], earliestOn: "8 Dec" }, null, undefined, null)),
  };
  expect(findingAside(item).wishes).toMatchObject({ order: [], earliestOn: null });
});

it("is named by what is known of it", () => {
  const wanted = {
    dayText: "Tue 8 Dec",
    day: "2026-12-08",
    timeText: "1015",
    siteId: "",
    therapistId: "",
    roomId: "",
  };
  const form = { wanted, patient, serviceId: "" };
  expect(asideBooking(form, "Follow-up").title).toBe("Follow-up, Tamsin Roe, Tue 8 Dec 10:15");
  const empty = { wanted: { ...wanted, dayText: "", timeText: "" }, patient: null, serviceId: "" };
  expect(asideBooking(empty, undefined).title).toBe("A booking");
});
