import { describe, expect, it } from "vitest";
import { durationWords, handout, sessionSummary } from "./handout";
import { emptyProgramme, newItems } from "./new-item";
import type { Programme } from "./programme";

let next = 0;
const id = () => `item-${++next}`;
const timed: Programme = {
  ...emptyProgramme,
  items: ["sit-to-stand", "step-up", "bridge"].flatMap((key) => newItems(key, "timed", id)),
};

describe("the handout", () => {
  it("says the session first", () => {
    expect(sessionSummary(timed)).toBe(
      "Four movements, 30 seconds each with 30 seconds of rest. Go round twice: 8 minutes. Do this on 3 days a week.",
    );
    const sets = {
      ...emptyProgramme,
      mode: "sets" as const,
      sessionsPerWeek: 7,
      items: newItems("bridge", "sets", id),
    };
    expect(sessionSummary(sets)).toBe("One exercise, about 2 minutes in all. Do this every day.");
  });

  it("joins left and right into one entry that keeps the first number", () => {
    const entries = handout(timed, "Eleri").entries;
    expect(entries.map((e) => [e.number, e.title])).toEqual([
      [1, "Sit to stand"],
      [2, "Step up, left then right"],
      [4, "Bridge"],
    ]);
  });

  it("keeps them apart where the sides differ", () => {
    const items = timed.items.map((item) =>
      item.side === "right" ? { ...item, support: "rail" as const } : item,
    );
    expect(handout({ ...timed, items }, "Eleri").entries.map((e) => e.title)).toContain(
      "Step up, right side",
    );
  });

  it("tells dose, support and needs", () => {
    const [sit] = handout(timed, "Eleri").entries;
    expect(sit).toMatchObject({ dose: "30 seconds, then rest 30 seconds.", hold: null, needs: "firm chair" });
    const items = newItems("wall-sit", "sets", id).map((item) => ({ ...item, support: "rail" as const }));
    const [wall] = handout({ ...emptyProgramme, mode: "sets", items }, "Eleri").entries;
    expect(wall).toMatchObject({
      dose: "2 sets of 10, holding each for 10 seconds. Rest 45 seconds between sets.",
      hold: "Hold the rail.",
      needs: "wall",
    });
  });

  it("puts seconds into words", () => {
    expect([45, 60, 90, 1200, 61].map(durationWords)).toEqual([
      "45 seconds",
      "1 minute",
      "1 minute and 30 seconds",
      "20 minutes",
      "1 minute and 1 second",
    ]);
  });
});
