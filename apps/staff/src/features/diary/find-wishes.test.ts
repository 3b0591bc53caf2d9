import { expect, test } from "vitest";
import { orderOf, promoted, readWishes, relaxed, timesQuery } from "./find-wishes";

test("an address fills in the wishes, and nothing that it cannot mean", () => {
  const wishes = readWishes(
    new URLSearchParams("on=2026-12-02&from=10:15&until=11&weekday=2&weekday=9&therapist=t&site=s"),
  );
  expect(wishes).toMatchObject({
    earliestOn: "2026-12-02",
    weekdays: ["2"],
    therapistId: "t",
    siteIds: ["s"],
  });
  expect(readWishes(new URLSearchParams("on=soon")).earliestOn).toBeNull();
});

test("the question carries times as the server reads them, and waits for a service", () => {
  const wishes = readWishes(new URLSearchParams("from=9&until=2"));
  expect(timesQuery(wishes, null)).toBeNull();
  expect(timesQuery({ ...wishes, serviceId: "initial" }, "joan")).toMatchObject({
    serviceId: "initial",
    patientId: "joan",
    fromTime: "09:00",
    untilTime: "14:00",
    therapistIds: [],
  });
});

test("a wish can be given up, and a concern moved forward", () => {
  expect(relaxed("hours")).toEqual({ fromText: "", untilText: "" });
  const usualOrder = orderOf({ wish: 40, wait: 30, knows: 20, day: 10 });
  expect(promoted(usualOrder, "knows")).toEqual(["wish", "knows", "wait", "day"]);
  expect(promoted(usualOrder, "wish")).toEqual(["wish", "wait", "knows", "day"]);
});
