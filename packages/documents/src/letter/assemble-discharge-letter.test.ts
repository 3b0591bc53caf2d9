import { letterHeadings, letterSection, letterSectionKeys } from "@withy/contracts/letters";
import { describe, expect, it } from "vitest";
import { assembleDischargeLetter } from "./assemble-discharge-letter";
import { missingSentences, staleSentences } from "./compare-with-record";
import type { DischargeFacts } from "./discharge-facts";
import { hipFacts } from "./scenario.test-data";

const textsOf = (facts: DischargeFacts, key: string) =>
  assembleDischargeLetter(facts)
    .find((section) => section.key === key)
    ?.sentences.map((sentence) => sentence.text) ?? [];

describe("a discharge letter assembled from the record", () => {
  it("says what the record says under each heading", () => {
    expect(textsOf(hipFacts, "diagnoses")).toEqual(["Hip osteoarthritis, left side."]);
    expect(textsOf(hipFacts, "referrer")).toEqual([
      "You referred Eleri Tamworth on 14 August 2026.",
      "Reason: six months of left groin pain on walking and stairs.",
    ]);
    expect(textsOf(hipFacts, "attendance")).toEqual([
      "Five visits were attended, from 6 October 2026 to 1 December 2026.",
      "One visit was missed without notice.",
    ]);
    expect(textsOf(hipFacts, "concerns")).toEqual([
      "Goal: Walk to the harbour and back (met by 24 November 2026).",
      "Goal: Kneel in the garden (not met yet).",
    ]);
    expect(textsOf(hipFacts, "findings")).toEqual([
      "At the first visit: Short steps on the left; cannot cross the leg.",
      "At the last visit: Even steps.",
    ]);
    expect(textsOf(hipFacts, "safety")).toEqual([
      "Warning signs asked about and absent: Fever or feeling unwell; Unexplained weight loss.",
      "One other sign was not asked about.",
    ]);
    expect(textsOf(hipFacts, "scales")).toEqual([
      "Pain on walking: 6 out of 10 on 6 October 2026, 3 on 1 December 2026. Better by 3, beyond measurement error (2.0).",
      "30-second chair stand: 13 stands on 1 December 2026. Not below average for women 60 to 64: 12 or more expected.",
    ]);
    expect(textsOf(hipFacts, "summary")).toEqual([
      "Treatment on 6 October 2026: advice and graded strength work.",
      "Treatment on 1 December 2026: practice on stairs.",
    ]);
    expect(textsOf(hipFacts, "advice")[0]).toBe(
      "Home programme of three exercises, two rounds, about 20 minutes a session, on three days a week: sit to stand (from a chair, no hands), bridge (both feet down) and side stepping (knees soft).",
    );
    expect(textsOf(hipFacts, "allergies")).toEqual([
      "Not recorded separately by this service; see Relevant history for what was asked.",
    ]);
  });

  it("gives the doctor and the patient actions of their own", () => {
    const plan = assembleDischargeLetter(hipFacts).find((section) => section.key === "plan");
    const actors = plan?.sentences.map((sentence) => sentence.actor);
    expect(actors).toEqual(["practice", "practice", "gp", "patient", "patient"]);
  });

  it("asks the doctor to look where a warning sign was present", () => {
    const redFlags = { present: ["Unexplained weight loss"], absent: [], notAsked: 0 };
    const facts = { ...hipFacts, episode: { ...hipFacts.episode, redFlags } };
    expect(textsOf(facts, "plan")).toContain("Please review the warning signs under Safety alerts.");
    expect(textsOf(facts, "safety")).toEqual(["Warning signs present: Unexplained weight loss."]);
  });

  it("says nothing that is not on record, and says what was not recorded", () => {
    const bare: DischargeFacts = {
      ...hipFacts,
      episode: {
        ...hipFacts.episode,
        side: "none",
        goals: [],
        redFlags: { present: [], absent: [], notAsked: 0 },
      },
      visits: { attended: 0, missed: 0, firstOn: null, lastOn: null },
      history: [],
      examined: { first: null, last: null },
      measures: [],
      treatments: [],
      programme: null,
      advice: [],
      plan: null,
    };
    const keys = assembleDischargeLetter(bare).map((section) => section.key);
    expect(keys).toEqual(["diagnoses", "plan", "referrer", "attendance", "safety", "allergies"]);
    expect(textsOf(bare, "attendance")).toEqual(["No visits were attended."]);
    expect(textsOf(bare, "safety")).toEqual(["No check for warning signs is on record."]);
  });

  it.each([
    ["Left knee pain", "left", "Left knee pain."],
    ["Knee pain", "both", "Knee pain, both sides."],
    ["Neck pain", "none", "Neck pain."],
    ["Pain in the right shoulder", "right", "Pain in the right shoulder."],
    ["Upright posture pain", "right", "Upright posture pain, right side."],
  ] as const)("names the side of %s once", (problem, side, said) => {
    expect(textsOf({ ...hipFacts, episode: { ...hipFacts.episode, problem, side } }, "diagnoses")).toEqual([
      said,
    ]);
  });

  it("ties every sentence to a row, with an id of its own, inside the contract and in the standard's order", () => {
    const sections = assembleDischargeLetter(hipFacts);
    for (const section of sections) letterSection.parse(section);
    const sentences = sections.flatMap((section) => section.sentences);
    expect(new Set(sentences.map((sentence) => sentence.id)).size).toBe(sentences.length);
    expect(sentences.filter((sentence) => sentence.source === null || sentence.source.label === "")).toEqual(
      [],
    );
    expect(sections.map((section) => section.heading)).toEqual(
      letterSectionKeys.map((key) => letterHeadings[key]),
    );
    expect(assembleDischargeLetter(structuredClone(hipFacts))).toEqual(sections);
  });
});

describe("a draft beside the record", () => {
  const draft = assembleDischargeLetter(hipFacts);
  const [pain, chair] = hipFacts.measures;
  if (!pain || !chair) throw new Error("the scenario has two measures");
  const rescored = { ...hipFacts, measures: [{ ...pain, last: { ...pain.last, score: "2" } }, chair] };

  it("finds the one sentence whose source has changed, and what the record says now", () => {
    expect(staleSentences(draft, draft)).toEqual([]);
    const stale = staleSentences(draft, assembleDischargeLetter(rescored));
    expect(stale.map((sentence) => sentence.id)).toEqual(["scales:pain"]);
    expect(stale[0]?.now).toContain("2 on 1 December 2026");
  });

  it("leaves alone what a person typed and what was left out, but not what was only edited", () => {
    const change = (id: string, to: object) =>
      draft.map((section) => ({
        ...section,
        sentences: section.sentences.map((sentence) =>
          sentence.id === id ? { ...sentence, ...to } : sentence,
        ),
      }));
    const fresh = assembleDischargeLetter(rescored);
    expect(staleSentences(change("scales:pain", { source: null, assembled: null }), fresh)).toEqual([]);
    expect(staleSentences(change("scales:pain", { text: "" }), fresh)).toEqual([]);
    expect(staleSentences(change("scales:pain", { text: "Pain is less." }), fresh).length).toBe(1);
  });

  it("finds what the record has gained and lost", () => {
    const without = assembleDischargeLetter({ ...hipFacts, measures: [pain] });
    expect(missingSentences(without, draft).flatMap((section) => section.sentences.map((s) => s.id))).toEqual(
      ["scales:chair-stand-30"],
    );
    expect(staleSentences(draft, without)).toEqual([
      { id: "scales:chair-stand-30", now: null, source: null },
    ]);
  });
});
