import { findMeasure } from "@withy/clinical/measures/catalogue";
import { checkEntry } from "@withy/clinical/measures/entry";
import type { Measure } from "@withy/clinical/measures/measure";
import { describe, expect, it } from "vitest";
import { emptyEpisode, episodeFrom, problemsIn } from "./typed-episode";
import { emptyFields, entryFrom, isBlank } from "./typed-measure";

function measure(key: string): Measure {
  const found = findMeasure(key);
  if (!found) throw new Error(`no measure ${key}`);
  return found;
}

describe("a measure as typed", () => {
  it("a blank is a blank, not 0, and a word is refused by its item", () => {
    const phq9 = measure("phq-9");
    const fields = { ...emptyFields(phq9), items: ["1", "", " 2 ", "x", "0", "", "", "", ""] };
    const entry = entryFrom(phq9, fields);
    expect(entry).toMatchObject({ answers: [1, null, 2, Number.NaN, 0, null, null, null, null] });
    expect(checkEntry(phq9, entry)?.field).toBe("answers.3");
  });
  it("offers the activities of last time to be scored again", () => {
    const psfs = measure("patient-specific-functional");
    const fields = emptyFields(psfs, ["Stairs", "Socks", "Garden", "Bed"]);
    expect(fields.activities).toEqual(
      ["Stairs", "Socks", "Garden", "Bed"].map((name) => ({ name, score: "" })),
    );
    expect(emptyFields(psfs).activities).toHaveLength(3);
    expect(isBlank(psfs, fields)).toBe(true);
  });
  it("reads a comma as a point, and asks for the stairs only where they count", () => {
    const stairs = measure("stair-climb");
    expect(entryFrom(stairs, { ...emptyFields(stairs), value: "14,5", steps: "9" })).toEqual({
      form: "reading",
      value: 14.5,
      steps: 9,
    });
    const stand = measure("chair-stand-30");
    expect(entryFrom(stand, { ...emptyFields(stand), value: "13", steps: "9" })).toEqual({
      form: "reading",
      value: 13,
      usedArms: false,
    });
  });
  it("no total is no number, which the rule refuses", () => {
    const total = measure("quickdash");
    expect(checkEntry(total, entryFrom(total, emptyFields(total)))?.field).toBe("value");
  });
});

describe("an episode as typed", () => {
  const typed = {
    ...emptyEpisode("site"),
    region: "hip",
    side: "left" as const,
    problem: "Hip osteoarthritis",
  };
  it("names what is missing, in the order of the form", () => {
    expect(problemsIn(emptyEpisode("site")).map((error) => error.id)).toEqual(["region", "side", "problem"]);
    expect(problemsIn({ ...typed, side: "none" }).map((error) => error.message)).toEqual([
      "Choose left, right or both for the hip.",
    ]);
    expect(problemsIn({ ...typed, plannedVisits: "six" }).map((error) => error.id)).toEqual([
      "plannedVisits",
    ]);
    expect(problemsIn(typed)).toEqual([]);
  });
  it("takes one goal a line and leaves out empty lines", () => {
    const input = episodeFrom(
      { ...typed, goals: " Walk \n\nGarden", plannedVisits: "6" },
      { patientId: "p", visitId: null },
    );
    expect(input).toMatchObject({ goals: ["Walk", "Garden"], plannedVisits: 6, appointmentId: null });
    expect(episodeFrom(emptyEpisode("site"), { patientId: "p", visitId: null })).toBeNull();
  });
});
