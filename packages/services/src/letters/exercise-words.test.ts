import { describe, expect, it } from "vitest";
import { exerciseWords } from "./exercise-words";

const sitToStand = { exercise: "sit-to-stand", form: "no-hands" };
const bridge = { exercise: "bridge", form: "both-feet" };

describe("exercises in a letter", () => {
  it.each([
    ["nothing for an empty programme", [], []],
    [
      "each with how it was last done",
      [sitToStand, bridge],
      ["sit to stand (from a chair, no hands)", "bridge (both feet down)"],
    ],
    [
      "both sides of one exercise as one",
      [sitToStand, bridge, sitToStand],
      ["sit to stand (from a chair, no hands)", "bridge (both feet down)"],
    ],
    [
      "two forms of one exercise as one exercise",
      [bridge, { exercise: "bridge", form: "pause" }],
      ["bridge (both feet down; both feet, long pause)"],
    ],
    [
      "a form that the library no longer holds by its exercise alone",
      [{ ...bridge, form: "gone" }],
      ["bridge"],
    ],
    [
      "an exercise that it no longer holds not at all",
      [{ exercise: "gone", form: "gone" }, bridge],
      ["bridge (both feet down)"],
    ],
  ])("%s", (_, items, words) => expect(exerciseWords(items)).toEqual(words));
});
