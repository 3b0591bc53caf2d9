import { describe, expect, it } from "vitest";
import { supports } from "../exercises/exercise";
import { exerciseLibrary } from "../exercises/library";
import { checkIssue, checkProgramme, programmeLimits } from "./check-programme";
import { emptyProgramme, newItems } from "./new-item";
import type { Programme, ProgrammeItem } from "./programme";

let next = 0;
const id = () => `item-${++next}`;
const one = (key: string, change: Partial<ProgrammeItem> = {}): Programme => {
  const [item] = newItems(key, "timed", id);
  if (!item) throw new Error(`${key} is in the library`);
  return { ...emptyProgramme, items: [{ ...item, ...change }] };
};

describe("checking a programme", () => {
  it.each(exerciseLibrary.map((e) => [e.key]))("%s can be added in both modes", (key) => {
    for (const mode of ["timed", "sets"] as const) {
      expect(checkProgramme({ ...emptyProgramme, mode, items: newItems(key, mode, id) })).toBeNull();
    }
  });

  it.each([
    ["an unknown exercise", one("bridge", { exercise: "none" }), "exercise-unknown", "items.0.exercise"],
    ["an unknown form", one("bridge", { form: "none" }), "exercise-unknown", "items.0.exercise"],
    ["a side on a movement of both", one("bridge", { side: "left" }), "side-not-wanted", "items.0.side"],
    ["no side where one is needed", one("step-up", { side: "both" }), "side-missing", "items.0.side"],
    ["too little work", one("bridge", { workSeconds: 4 }), "programme-number", "items.0.workSeconds"],
    ["half a second", one("bridge", { restSeconds: 0.5 }), "programme-number", "items.0.restSeconds"],
    ["no rounds", { ...one("bridge"), rounds: 0 }, "programme-number", "rounds"],
    ["a hundred sessions", { ...one("bridge"), sessionsPerWeek: 100 }, "programme-number", "sessionsPerWeek"],
    [
      "too many sets",
      { ...one("bridge", { sets: 11 }), mode: "sets" as const },
      "programme-number",
      "items.0.sets",
    ],
  ])("refuses %s", (_, programme, kind, field) => {
    expect(checkProgramme(programme)).toMatchObject({ kind, field });
  });

  it("refuses more lines than anyone would do", () => {
    const [item] = one("bridge").items;
    if (!item) throw new Error("there is one item");
    const items = Array.from({ length: programmeLimits.items + 1 }, () => ({ ...item, id: id() }));
    expect(checkProgramme({ ...emptyProgramme, items })).toMatchObject({ kind: "programme-too-long" });
  });

  it("allows any hand support on any exercise", () => {
    for (const e of exerciseLibrary) {
      for (const support of supports) {
        const items = newItems(e.key, "timed", id).map((item) => ({ ...item, support }));
        expect(checkProgramme({ ...emptyProgramme, items })).toBeNull();
      }
    }
  });

  it("ignores the numbers that the mode does not use", () => {
    expect(checkProgramme(one("bridge", { sets: 99 }))).toBeNull();
  });
});

describe("giving a programme to the patient", () => {
  it("allows an empty draft to be saved, not to be given", () => {
    expect(checkProgramme(emptyProgramme)).toBeNull();
    expect(checkIssue(emptyProgramme)).toMatchObject({ kind: "programme-empty" });
  });

  it("asks for a swap where equipment is missing", () => {
    const programme = { ...one("sit-to-stand"), equipmentMissing: ["chair" as const] };
    expect(checkIssue(programme)).toMatchObject({ kind: "equipment-missing", field: "items.0.form" });
    expect(checkIssue(one("sit-to-stand"))).toBeNull();
  });
});
