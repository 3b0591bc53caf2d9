import { sessionTime } from "@withy/clinical/programmes/compute-time";
import { emptyProgramme } from "@withy/clinical/programmes/new-item";
import type { Programme } from "@withy/clinical/programmes/programme";
import { describe, expect, it } from "vitest";
import {
  addExercise,
  changeAll,
  climb,
  ladderFrom,
  moveItem,
  putBack,
  removeItem,
  setEquipmentMissing,
} from "./draft-changes";

let next = 0;
const id = () => `item-${++next}`;
const build = (...keys: string[]): Programme =>
  keys.reduce<Programme>((programme, key) => addExercise(programme, key, null, id).programme, emptyProgramme);
const keysOf = (programme: Programme) => programme.items.map((item) => `${item.exercise} ${item.side}`);

describe("building a programme", () => {
  it("adds after the chosen line, one line for each side", () => {
    const two = build("bridge", "heel-raise");
    const first = two.items[0]?.id ?? "";
    const { programme, firstId } = addExercise(two, "step-up", first, id);
    expect(keysOf(programme)).toEqual(["bridge both", "step-up left", "step-up right", "heel-raise both"]);
    expect(programme.items[1]?.id).toBe(firstId);
  });

  it("never comes between the left and the right of one movement", () => {
    const pair = build("step-up");
    const left = pair.items[0]?.id ?? "";
    expect(keysOf(addExercise(pair, "bridge", left, id).programme)).toEqual([
      "step-up left",
      "step-up right",
      "bridge both",
    ]);
  });

  it("moves and removes lines, and ignores places that are not there", () => {
    const three = build("bridge", "clam");
    const [a, b, c] = three.items.map((item) => item.id);
    expect(moveItem(three, a ?? "", 2).items.map((item) => item.id)).toEqual([b, c, a]);
    expect(moveItem(three, c ?? "", 0).items.map((item) => item.id)).toEqual([c, a, b]);
    expect(moveItem(three, a ?? "", 3)).toBe(three);
    expect(moveItem(three, "none", 0)).toBe(three);
    const without = removeItem(three, a ?? "");
    expect(keysOf(without)).toEqual(["clam left", "clam right"]);
    const [bridge] = three.items;
    if (!bridge) throw new Error("the bridge is the first line");
    expect(keysOf(putBack({ ...without, rounds: 5 }, bridge, 0))).toEqual(keysOf(three));
    expect(putBack(three, bridge, 0)).toBe(three);
  });

  it("climbs the ladder, says why it ends, and passes over what is not at home", () => {
    const programme = build("bridge");
    const line = programme.items[0]?.id ?? "";
    expect(climb(programme, line, "harder").programme.items[0]?.form).toBe("pause");
    const down = climb(climb(programme, line, "easier").programme, line, "easier");
    expect(down.said).toContain("already in its easiest form");
    const bandless = { ...programme, equipmentMissing: ["band" as const] };
    expect(ladderFrom(bandless, { exercise: "leg-out-standing", form: "no-touch" }, "harder")).toMatchObject({
      ok: false,
    });
    expect(ladderFrom(programme, { exercise: "leg-out-standing", form: "no-touch" }, "harder")).toMatchObject(
      {
        ok: true,
        to: { form: "band" },
      },
    );
  });

  it("keeps the clock when equipment is taken away", () => {
    const programme = build("sit-to-stand", "step-up", "row");
    const bare = setEquipmentMissing(programme, ["chair", "step", "stairs", "band", "weight"]);
    expect(sessionTime(bare)).toEqual(sessionTime(programme));
    expect(bare.items.every((item) => item.insteadOf !== null)).toBe(true);
    expect(setEquipmentMissing(bare, []).items).toEqual(programme.items);
  });

  it("adds only what can be done at home", () => {
    const { programme } = addExercise(
      { ...emptyProgramme, equipmentMissing: ["chair"] },
      "sit-to-stand",
      null,
      id,
    );
    expect(programme.items[0]).toMatchObject({ exercise: "squat", insteadOf: { exercise: "sit-to-stand" } });
  });

  it("sets work and rest for all lines at once", () => {
    const programme = changeAll(build("bridge", "clam"), { workSeconds: 40, restSeconds: 20 });
    expect(new Set(programme.items.map((item) => `${item.workSeconds}+${item.restSeconds}`))).toEqual(
      new Set(["40+20"]),
    );
    expect(sessionTime(programme).elapsedSeconds).toBe(3 * 2 * 60);
  });
});
