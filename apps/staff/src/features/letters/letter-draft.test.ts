import type { LetterView } from "@withy/contracts/letters";
import { describe, expect, it } from "vitest";
import { absentSections, draftOf, saveInputOf, withActor, withNewSentence, withText } from "./letter-draft";

const sentence = {
  id: "plan:gp",
  text: "No action.",
  source: null,
  assembled: null,
  actor: "gp" as const,
  keptBecause: null,
};
const letter = {
  recipient: {
    kind: "gp",
    name: "Dr Hanne Pryor",
    addressLines: ["Quayside Surgery", "ZZ4 1AB"],
    email: null,
  },
  sections: [{ key: "plan", heading: "Plan and requested actions", sentences: [sentence] }],
} as unknown as LetterView;

describe("a letter being written", () => {
  it("goes back to the server as it came where nothing was typed", () => {
    expect(saveInputOf("id", 3, draftOf(letter))).toEqual({
      letterId: "id",
      version: 3,
      recipient: { name: "Dr Hanne Pryor", addressLines: ["Quayside Surgery", "ZZ4 1AB"], email: "" },
      sections: [{ key: "plan", sentences: [{ id: "plan:gp", text: "No action.", actor: "gp" }] }],
    });
  });

  it("changes the one sentence that was typed in", () => {
    const typed = withActor(
      withText(draftOf(letter), "plan", "plan:gp", "Rest."),
      "plan",
      "plan:gp",
      "patient",
    );
    expect(typed.sections[0]?.sentences).toEqual([{ ...sentence, text: "Rest.", actor: "patient" }]);
  });

  it("puts a new part where the standard has it, and knows which are not there", () => {
    const draft = withNewSentence(
      withNewSentence(draftOf(letter), "allergies", "new-1"),
      "diagnoses",
      "new-2",
    );
    expect(draft.sections.map((section) => section.key)).toEqual(["diagnoses", "plan", "allergies"]);
    expect(absentSections(draft)).not.toContain("allergies");
    expect(absentSections(draft)).toContain("history");
  });
});
