import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { draftKey, groupByDraft } from "./draft-groups";

const visit = (id: number, patientId: string, payerId: string | null, siteId: string) => ({
  id,
  patientId,
  payerId,
  siteId,
});

describe("visits by draft", () => {
  it("part by patient, by payer and by site, in the order in which they come", () => {
    const groups = groupByDraft([
      visit(1, "perran", null, "saltgate"),
      visit(2, "eleri", null, "saltgate"),
      visit(3, "perran", "kittiwake", "saltgate"),
      visit(4, "perran", null, "tollhouse"),
      visit(5, "perran", null, "saltgate"),
    ]);
    expect(groups.map((group) => group.map((v) => v.id))).toEqual([[1, 5], [2], [3], [4]]);
  });

  it("hold every visit once, and one key a group", () => {
    const few = fc.constantFrom("a", "b", "c");
    const any = fc.record({
      id: fc.integer(),
      patientId: few,
      payerId: fc.option(few),
      siteId: few,
    });
    fc.assert(
      fc.property(fc.array(any), (visits) => {
        const groups = groupByDraft(visits);
        expect(groups.flat()).toHaveLength(visits.length);
        expect(new Set(groups.flat())).toEqual(new Set(visits));
        for (const group of groups) expect(new Set(group.map(draftKey)).size).toBe(1);
        expect(new Set(groups.map(([first]) => first && draftKey(first))).size).toBe(groups.length);
      }),
    );
  });
});
