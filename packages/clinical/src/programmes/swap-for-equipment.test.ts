import { describe, expect, it } from "vitest";
import { equipment } from "../exercises/exercise";
import { exerciseLibrary, findForm } from "../exercises/library";
import { sessionTime } from "./compute-time";
import { emptyProgramme, newItems } from "./new-item";
import type { Programme } from "./programme";
import { alternativeFor, missingFor, swapForEquipment } from "./swap-for-equipment";

let next = 0;
const id = () => `item-${++next}`;

const everyForm = exerciseLibrary.flatMap((e) => e.forms.map((f) => ({ exercise: e.key, form: f.key })));

describe("swapping for equipment", () => {
  it("turns a kettlebell hinge into hands on shins and leaves the clock", () => {
    const [hinge] = newItems("hip-hinge", "timed", id);
    if (!hinge) throw new Error("hip-hinge is in the library");
    const programme: Programme = { ...emptyProgramme, items: [{ ...hinge, form: "kettlebell" }] };
    const swapped = swapForEquipment(programme, ["kettlebell"]);
    expect(swapped.items[0]).toMatchObject({
      exercise: "hip-hinge",
      form: "hands-to-shins",
      workSeconds: 30,
      restSeconds: 30,
      insteadOf: { exercise: "hip-hinge", form: "kettlebell" },
    });
    expect(sessionTime(swapped)).toEqual(sessionTime(programme));
    expect(swapForEquipment(swapped, []).items[0]).toMatchObject({ form: "kettlebell", insteadOf: null });
  });

  it("goes to another exercise where no form can be done", () => {
    expect(alternativeFor({ exercise: "cycle", form: "steady" }, ["cycle"])).toEqual({
      exercise: "brisk-walk",
      form: "steady",
    });
    expect(alternativeFor({ exercise: "step-up", form: "stair" }, ["stairs"])).toEqual({
      exercise: "step-up",
      form: "fifteen",
    });
  });

  it("leaves alone what the home can do", () => {
    expect(alternativeFor({ exercise: "bridge", form: "both-feet" }, [...equipment])).toBeNull();
    expect(missingFor({ exercise: "row", form: "band" }, ["chair"])).toEqual([]);
  });

  it.each(everyForm)("$exercise/$form can always be done with nothing at home", (ref) => {
    const instead = alternativeFor(ref, [...equipment]) ?? ref;
    expect(findForm(instead.exercise, instead.form)?.needs).toEqual([]);
  });

  it("keeps items, sides, order and time for a programme of everything", () => {
    const items = exerciseLibrary.flatMap((e) => newItems(e.key, "timed", id));
    const programme: Programme = { ...emptyProgramme, items };
    const swapped = swapForEquipment(programme, [...equipment]);
    expect(swapped.items.map((i) => [i.id, i.side, i.workSeconds])).toEqual(
      items.map((i) => [i.id, i.side, i.workSeconds]),
    );
    expect(sessionTime(swapped)).toEqual(sessionTime(programme));
    expect(swapForEquipment(swapped, []).items).toEqual(items);
  });
});
