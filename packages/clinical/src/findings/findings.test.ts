import { describe, expect, it } from "vitest";
import { regions } from "../episodes/sides";
import { checkRange, movements, type RangeFinding } from "./range-of-movement";
import { type FlagAnswer, readRedFlags, redFlagGroups, redFlagsFor } from "./red-flags";
import { readStrengthGrade } from "./strength";

describe("range of movement", () => {
  it("every reference lies inside its gross bounds", () => {
    for (const { bounds, reference } of movements) {
      for (const degrees of Object.values(reference)) {
        expect(degrees).toBeGreaterThan(bounds[0]);
        expect(degrees).toBeLessThan(bounds[1]);
      }
    }
  });
  it.each<[string, Partial<RangeFinding>, string | undefined]>([
    ["a stiff knee", { movement: "knee-flexion", degrees: -15 }, undefined],
    ["a supple knee", { movement: "knee-flexion", degrees: 170 }, undefined],
    ["no knee", { movement: "knee-flexion", degrees: 171 }, "degrees"],
    ["half a degree", { movement: "knee-flexion", degrees: 90.5 }, "degrees"],
    ["no movement", { movement: "tail-wagging", degrees: 10 }, "movement"],
  ])("%s", (_name, finding, field) => {
    expect(
      checkRange({ movement: "hip-flexion", side: "left", way: "active", degrees: 90, ...finding })?.field,
    ).toBe(field);
  });
});

describe("strength", () => {
  it.each<[string, string | null]>([
    ["4+", "4+"],
    ["4 -", "4-"],
    ["5/5", "5"],
    ["4+/5", "4+"],
    ["6", null],
    ["", null],
    ["2+", null],
  ])("%s reads as %s", (text, grade) => expect(readStrengthGrade(text)).toBe(grade));
});

describe("red flags", () => {
  it("each question has its own key", () => {
    const keys = redFlagGroups.flatMap((g) => g.flags.map((f) => f.key));
    expect(new Set(keys).size).toBe(keys.length);
  });
  it("names only regions that exist, and asks something for each", () => {
    const known = regions.map((r) => r.key);
    for (const group of redFlagGroups) for (const region of group.regions) expect(known).toContain(region);
    for (const key of known) expect(redFlagsFor(key).length).toBeGreaterThan(0);
  });
  it("asks about the saddle for a back and not for a hip", () => {
    expect(redFlagsFor("lower-back").map((g) => g.key)).toContain("cauda-equina");
    expect(redFlagsFor("hip").map((g) => g.key)).not.toContain("cauda-equina");
  });
  it("says what was asked, and puts the emergency first", () => {
    const all = Object.fromEntries(
      redFlagsFor("hip").flatMap((g) => g.flags.map((f): [string, FlagAnswer] => [f.key, "absent"])),
    );
    expect(readRedFlags("hip", {}).words).toBe("Red flags not asked");
    expect(readRedFlags("hip", all).words).toBe("Red flags asked, none");
    expect(readRedFlags("hip", { trauma: "absent" }).words).toMatch(/^Red flags: 1 of \d+ asked$/);
    const found = readRedFlags("hip", { ...all, "night-pain": "present", "hot-joint": "present" });
    expect(found.words).toBe("Red flags: 2 present");
    expect(found.present.map((p) => p.isEmergency)).toEqual([true, false]);
    expect(found.present[0]?.action).toContain("hospital today");
  });
});
