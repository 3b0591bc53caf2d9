import { describe, expect, it } from "vitest";
import { exerciseLibrary, findExercise } from "../exercises/library";
import { ladderPlace, stepEasier, stepHarder } from "./ladder";

const every = exerciseLibrary.flatMap((e) => e.forms.map((f) => ({ exercise: e.key, form: f.key })));
const levelOf = (ref: { exercise: string; form: string }) =>
  findExercise(ref.exercise)?.forms.find((f) => f.key === ref.form)?.level ?? Number.NaN;

describe("the ladder", () => {
  it("goes up and down one rung", () => {
    expect(stepHarder({ exercise: "bridge", form: "both-feet" })).toEqual({
      ok: true,
      to: { exercise: "bridge", form: "pause" },
    });
    expect(stepEasier({ exercise: "bridge", form: "both-feet" })).toEqual({
      ok: true,
      to: { exercise: "bridge", form: "small-lift" },
    });
    expect(ladderPlace({ exercise: "bridge", form: "both-feet" })).toEqual({ rung: 2, rungs: 5 });
  });

  it("goes on in the next exercise at the top", () => {
    expect(stepHarder({ exercise: "side-leg-lift", form: "band" })).toMatchObject({ ok: false });
    expect(stepHarder({ exercise: "squat", form: "weight" })).toMatchObject({
      ok: false,
      why: { kind: "ladder-top" },
    });
    expect(stepHarder({ exercise: "step-up", form: "stair-slow" })).toEqual({
      ok: true,
      to: { exercise: "step-down", form: "stair" },
    });
    expect(stepEasier({ exercise: "step-down", form: "five" })).toEqual({
      ok: true,
      to: { exercise: "step-up", form: "ten" },
    });
  });

  it.each(every)("$exercise/$form: up is harder, down is easier, and the movement keeps its sides", (ref) => {
    const up = stepHarder(ref);
    const down = stepEasier(ref);
    const sides = findExercise(ref.exercise)?.sides;
    if (up.ok) {
      expect(levelOf(up.to)).toBeGreaterThan(levelOf(ref));
      expect(findExercise(up.to.exercise)?.sides).toBe(sides);
    } else expect(up.why.kind).toBe("ladder-top");
    if (down.ok) {
      expect(levelOf(down.to)).toBeLessThan(levelOf(ref));
      expect(findExercise(down.to.exercise)?.sides).toBe(sides);
    } else expect(down.why.kind).toBe("ladder-bottom");
  });

  it("offers an easier and a harder form for at least one form of every exercise", () => {
    for (const e of exerciseLibrary) {
      const middle = e.forms[1];
      expect(stepEasier({ exercise: e.key, form: middle?.key ?? "" }).ok).toBe(true);
      expect(stepHarder({ exercise: e.key, form: middle?.key ?? "" }).ok).toBe(true);
    }
  });

  it("refuses what is not in the library", () => {
    expect(stepHarder({ exercise: "none", form: "x" })).toMatchObject({
      ok: false,
      why: { kind: "exercise-unknown" },
    });
    expect(ladderPlace({ exercise: "bridge", form: "x" })).toBeNull();
  });
});
