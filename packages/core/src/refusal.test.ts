import { expect, it } from "vitest";
import { refusal } from "./refusal";

it("a refusal about one field names it", () => {
  expect(refusal("slot-taken", "That time is taken.", "startsAt")).toStrictEqual({
    kind: "slot-taken",
    message: "That time is taken.",
    field: "startsAt",
  });
});

it("a refusal about no field has none, not an empty one", () => {
  expect(refusal("closed", "The site is closed.")).toStrictEqual({
    kind: "closed",
    message: "The site is closed.",
  });
});
