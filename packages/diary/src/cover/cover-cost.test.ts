import { describe, expect, test } from "vitest";
import { type CoverChange, coverCost } from "./cover-cost";
import type { CoverVisit } from "./cover-problem";

const visit: CoverVisit = {
  id: "v",
  patientIds: ["p"],
  startsAt: 0,
  durationMinutes: 30,
  cleanDownMinutes: 5,
  siteId: "here",
  therapistId: "own",
  roomId: "r1",
  therapistIds: ["own", "known", "new"],
  roomKind: "treatment",
  needsEquipment: [],
  seenBy: ["own", "known"],
  isInCourse: false,
};
const same: CoverChange = { therapistId: "own", siteId: "here", roomId: "r1", days: 0, minutes: 0 };

describe("what a change costs", () => {
  test.each<[string, Partial<CoverChange>, Partial<CoverVisit>, number, string[]]>([
    ["nothing changed", {}, {}, 0, []],
    ["another room", { roomId: "r2" }, {}, 1, ["another room"]],
    ["a known therapist", { therapistId: "known" }, {}, 15, ["another therapist, who knows the patient"]],
    ["a new therapist", { therapistId: "new" }, {}, 40, ["a new therapist"]],
    [
      "a course",
      { therapistId: "new" },
      { isInCourse: true },
      65,
      ["a new therapist", "the course changes hands"],
    ],
    ["an hour later", { minutes: 60 }, {}, 12, ["1 h later"]],
    ["odd minutes earlier", { minutes: -95 }, {}, 19, ["1 h 35 min earlier"]],
    ["the day after", { days: 1 }, {}, 60, ["the day after, same time"]],
    ["three days after", { days: 3, minutes: 20 }, {}, 92, ["3 days after, 20 min later"]],
    ["another site", { siteId: "there", roomId: "r9" }, {}, 46, ["another site"]],
    [
      "a class of three, each bearing it",
      { therapistId: "new", minutes: 10, roomId: "r2" },
      { patientIds: ["p", "q", "r"] },
      127,
      ["a new therapist", "10 min later", "another room"],
    ],
  ])("%s", (_name, change, who, cost, reasons) => {
    expect(coverCost({ ...visit, ...who }, { ...same, ...change })).toEqual({ cost, reasons });
  });

  test("is in the order that the table promises", () => {
    const of = (change: Partial<CoverChange>) => coverCost(visit, { ...same, ...change }).cost;
    const [room, hour, known] = [of({ roomId: "r2" }), of({ minutes: 60 }), of({ therapistId: "known" })];
    const [fresh, site, day] = [of({ therapistId: "new" }), of({ siteId: "there" }), of({ days: 1 })];
    expect([room, hour, known, fresh, site, day]).toEqual(
      [room, hour, known, fresh, site, day].sort((a, b) => a - b),
    );
  });
});
