import { describe, expect, it } from "vitest";
import { drawMovement, drawStart } from "./draw-figure";
import { regions } from "./exercise";
import { exerciseLibrary, findExercise, findForm, searchExercises, standardForm } from "./library";

describe("the exercise library", () => {
  it("has at least sixty exercises with unique keys and names, and every region", () => {
    expect(exerciseLibrary.length).toBeGreaterThanOrEqual(60);
    expect(new Set(exerciseLibrary.map((e) => e.key)).size).toBe(exerciseLibrary.length);
    expect(new Set(exerciseLibrary.map((e) => e.name)).size).toBe(exerciseLibrary.length);
    expect(new Set(exerciseLibrary.map((e) => e.region))).toEqual(new Set(regions));
  });

  it.each(exerciseLibrary.map((e) => [e.key, e] as const))("%s is whole", (_, e) => {
    expect(e.purpose.length).toBeGreaterThan(20);
    expect(e.start.length).toBeGreaterThan(15);
    expect(e.steps.length).toBeGreaterThanOrEqual(3);
    expect(e.cautions.length).toBeGreaterThanOrEqual(2);
    expect(e.muscles.length).toBeGreaterThan(0);
    expect(e.supports.length).toBeGreaterThan(0);
    expect(standardForm(e).key).toBe(e.standard);
    for (const sentence of [e.purpose, e.start, ...e.steps, ...e.cautions, ...e.forms.map((f) => f.how)]) {
      expect(sentence).toMatch(/[.]$/);
      expect(sentence).not.toMatch(/[—!]/);
    }
  });

  it.each(exerciseLibrary.map((e) => [e.key, e] as const))("%s has a ladder that only rises", (_, e) => {
    expect(e.forms.length).toBeGreaterThanOrEqual(3);
    expect(new Set(e.forms.map((f) => f.key)).size).toBe(e.forms.length);
    const levels = e.forms.map((f) => f.level);
    for (const [i, level] of levels.entries()) {
      expect(level).toBeGreaterThanOrEqual(1);
      expect(level).toBeLessThanOrEqual(10);
      if (i > 0) expect(level).toBeGreaterThan(levels[i - 1] ?? 0);
    }
  });

  it.each(exerciseLibrary.map((e) => [e.key, e] as const))("%s has doses from low to high", (_, e) => {
    for (const [low, high] of Object.values(e.dose)) {
      expect(low).toBeLessThanOrEqual(high);
      expect(low).toBeGreaterThanOrEqual(0);
    }
  });

  const needy = exerciseLibrary.filter((e) => e.forms.some((f) => f.needs.length > 0));
  it.each(needy.map((e) => [e.key, e] as const))("%s has an alternative that needs nothing", (_, e) => {
    const ref = e.withoutEquipment;
    if (ref === null) throw new Error(`${e.key} has no alternative`);
    const other = findExercise(ref.exercise);
    expect(findForm(ref.exercise, ref.form)?.needs).toEqual([]);
    // A swap never changes how many timed items the movement is, so it never changes the clock.
    expect(other?.sides).toBe(e.sides);
  });

  it("leads from ladder to ladder without ever coming back", () => {
    for (const start of exerciseLibrary) {
      const seen = new Set([start.key]);
      let next = start.leadsTo;
      while (next !== null) {
        expect(seen.has(next)).toBe(false);
        seen.add(next);
        const exercise = findExercise(next);
        if (!exercise) throw new Error(`${next} is not in the library`);
        next = exercise.leadsTo;
      }
    }
  });

  it.each(exerciseLibrary.filter((e) => e.leadsTo !== null).map((e) => [e.key, e] as const))(
    "%s leads to something harder",
    (_, e) => {
      const next = findExercise(e.leadsTo ?? "");
      expect(Math.max(...(next?.forms ?? []).map((f) => f.level))).toBeGreaterThan(
        Math.max(...e.forms.map((f) => f.level)),
      );
    },
  );

  it("draws every figure with finite numbers only", () => {
    for (const e of exerciseLibrary) {
      for (const drawing of [drawStart(e.figure), drawMovement(e.figure)]) {
        const paths = [...drawing.props, ...drawing.ghost, ...drawing.far, ...drawing.near, drawing.nearArm];
        expect(paths.length).toBeGreaterThan(8);
        for (const { d } of paths) expect(d).not.toMatch(/NaN|Infinity/);
      }
    }
  });
});

describe("searching", () => {
  it("finds by words in any order, name first", () => {
    expect(searchExercises({ words: "stand sit" })[0]?.key).toBe("sit-to-stand");
    expect(searchExercises({ words: "  STEP up " })[0]?.key).toBe("step-up");
    expect(searchExercises({ words: "buttocks" }).length).toBeGreaterThan(4);
    expect(searchExercises({ words: "zebra" })).toEqual([]);
  });

  it("filters by region, kind and equipment at hand", () => {
    expect(searchExercises({ region: "neck" }).every((e) => e.region === "neck")).toBe(true);
    expect(searchExercises({ kind: "balance" }).every((e) => e.kinds.includes("balance"))).toBe(true);
    const bare = searchExercises({ equipmentAtHand: [] });
    expect(bare.map((e) => e.key)).not.toContain("sit-to-stand");
    expect(searchExercises({ equipmentAtHand: ["chair"] }).map((e) => e.key)).toContain("sit-to-stand");
  });
});
