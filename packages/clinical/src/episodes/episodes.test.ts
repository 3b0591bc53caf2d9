import { describe, expect, it } from "vitest";
import { problemsOf, workingProblems } from "./problems";
import { checkSide, placeWords, regions } from "./sides";
import { checkDischarge, checkReopen, checkTreat, episodeMoves, episodeStates } from "./states";

describe("states", () => {
  it("every move leads to a state", () => {
    for (const from of episodeStates) {
      for (const to of Object.values(episodeMoves[from])) expect(episodeStates).toContain(to);
    }
  });
  it.each<[string, Parameters<typeof checkDischarge>[0], string | undefined]>([
    ["open, all signed", { state: "open", unsignedNotes: 0, signedNotes: 4 }, undefined],
    ["one draft left", { state: "open", unsignedNotes: 1, signedNotes: 4 }, "notes-unsigned"],
    ["nothing written", { state: "open", unsignedNotes: 0, signedNotes: 0 }, "nothing-written"],
    ["already ended", { state: "discharged", unsignedNotes: 0, signedNotes: 4 }, "already-discharged"],
  ])("discharge: %s", (_name, episode, kind) => expect(checkDischarge(episode)?.kind).toBe(kind));
  it("says how many notes are unsigned", () => {
    expect(checkDischarge({ state: "open", unsignedNotes: 2, signedNotes: 1 })?.message).toContain(
      "2 notes are not signed yet",
    );
    expect(checkDischarge({ state: "open", unsignedNotes: 1, signedNotes: 1 })?.message).toContain(
      "One note is not signed yet",
    );
  });
  it("only a discharged one is reopened, and only an open one is treated", () => {
    expect(checkReopen({ state: "open" })?.kind).toBe("still-open");
    expect(checkReopen({ state: "discharged" })).toBeNull();
    expect(checkTreat({ state: "discharged" })?.kind).toBe("episode-discharged");
    expect(checkTreat({ state: "open" })).toBeNull();
  });
});

describe("region and side", () => {
  it.each<[string, Parameters<typeof placeWords>, string]>([
    ["hip", ["hip", "left"], "Left hip"],
    ["both knees", ["knee", "both"], "Knee, both sides"],
    ["back", ["lower-back", "none"], "Lower back"],
  ])("%s", (_name, args, words) => expect(placeWords(...args)).toBe(words));
  it("a limb needs a side, the whole body has none", () => {
    expect(checkSide("hip", "none")).toBe("Choose left, right or both for the hip.");
    expect(checkSide("hip", "left")).toBeNull();
    expect(checkSide("balance", "left")).toBe("Balance and walking has no side. Choose no side.");
    expect(checkSide("lower-back", "none")).toBeNull();
    expect(checkSide("tail", "none")).toBe("Choose the region from the list.");
  });
  it("every region has problems to choose from, each once", () => {
    for (const { key } of regions) expect(problemsOf(key).length).toBeGreaterThan(1);
    const all = Object.values(workingProblems).flat();
    expect(new Set(all).size).toBe(all.length);
    expect(Object.keys(workingProblems).sort()).toEqual(regions.map((r) => r.key).sort());
  });
});
