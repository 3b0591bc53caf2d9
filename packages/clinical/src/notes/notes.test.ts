import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkAddendum, checkLength, checkSign, checkWrite, emptyHeadings } from "./check-note";
import { isStateKept, readEntryTimes } from "./entry-times";
import { headingsOf, noteKinds } from "./headings";
import {
  draftNoteText,
  isSameText,
  longestHeading,
  type SignedFacts,
  signedForm,
  tidyNoteText,
} from "./note-text";
import { noteMoves, noteStates } from "./states";

const draft = { kind: "session", state: "draft", authorId: "reed", authorName: "Hollis Reed" } as const;
const signed = { ...draft, state: "signed" } as const;
const signer = { id: "reed", registrationNumber: "PH012345" };
const full = {
  history: "Better",
  examination: "Flexion 105",
  consent: "Agreed",
  treatment: "Step up",
  plan: "Twice a week",
};

describe("headings", () => {
  it.each(noteKinds)("%s: each key once, the plan last and required", (kind) => {
    const keys = headingsOf(kind).map((h) => h.key);
    expect(new Set(keys).size).toBe(keys.length);
    expect(keys.at(-1)).toBe("plan");
    expect(headingsOf(kind).at(-1)?.isRequired).toBe(true);
  });
});

describe("states", () => {
  it("every move leads to a state, and a signed note never becomes a draft", () => {
    for (const from of noteStates) {
      for (const to of Object.values(noteMoves[from])) expect(noteStates).toContain(to);
    }
    expect(Object.values(noteMoves.signed)).not.toContain("draft");
  });
});

describe("writing", () => {
  it.each<[string, Parameters<typeof checkWrite>, string | undefined]>([
    ["the author in a draft", [draft, "reed"], undefined],
    ["someone else", [draft, "okafor"], "not-the-author"],
    ["the author after signing", [signed, "reed"], "note-signed"],
  ])("%s", (_name, args, kind) => expect(checkWrite(...args)?.kind).toBe(kind));

  it("names the heading that is too long", () => {
    expect(checkLength("session", { plan: "x".repeat(longestHeading) })).toBeNull();
    expect(checkLength("session", { plan: "x".repeat(longestHeading + 1) })).toMatchObject({
      kind: "heading-too-long",
      field: "body.plan",
    });
  });
});

describe("signing", () => {
  it("takes a full draft of one's own", () => {
    expect(checkSign({ ...draft, text: full }, signer)).toBeNull();
  });
  it.each<[string, Parameters<typeof checkSign>, string]>([
    ["a signed note", [{ ...signed, text: full }, signer], "note-signed"],
    [
      "someone else's",
      [
        { ...draft, text: full },
        { ...signer, id: "okafor" },
      ],
      "not-the-author",
    ],
    [
      "without a registration number",
      [
        { ...draft, text: full },
        { ...signer, registrationNumber: null },
      ],
      "no-registration-number",
    ],
    ["an empty plan", [{ ...draft, text: { ...full, plan: " \n" } }, signer], "headings-empty"],
  ])("refuses %s", (_name, args, kind) => expect(checkSign(...args)?.kind).toBe(kind));

  it("names the empty headings and points at the first", () => {
    const refusal = checkSign({ ...draft, text: { history: "Better", consent: "Agreed" } }, signer);
    expect(refusal?.message).toBe("Write something under Examination, Treatment given and Plan, then sign.");
    expect(refusal?.field).toBe("body.examination");
  });
  it("an initial assessment asks for its own headings", () => {
    expect(emptyHeadings("initial", {}).map((h) => h.label)).toEqual([
      "History",
      "What it stops",
      "General health",
      "Examination",
      "Assessment",
      "Consent",
      "Plan",
    ]);
  });
});

describe("addenda", () => {
  it.each<[string, Parameters<typeof checkAddendum>, string | undefined]>([
    ["to a signed note", [signed, { text: "Left, not right", reason: "Side was wrong" }], undefined],
    ["to a draft", [draft, { text: "More", reason: "Forgot" }], "note-not-signed"],
    ["without a reason", [signed, { text: "More", reason: "  " }], "reason-missing"],
    ["without words", [signed, { text: "", reason: "Forgot" }], "text-missing"],
  ])("%s", (_name, args, kind) => expect(checkAddendum(...args)?.kind).toBe(kind));
});

describe("times of visit and entry", () => {
  const zone = "Europe/London";
  it.each<[string, string, string, boolean, string]>([
    [
      "same day",
      "2026-12-01T10:15:00Z",
      "2026-12-01T10:44:00Z",
      false,
      "Visit 1 December 2026 at 10:15, written 10:44",
    ],
    [
      "next day",
      "2026-12-01T17:30:00Z",
      "2026-12-02T08:05:00Z",
      true,
      "Visit 1 December 2026 at 17:30. Late entry, written 2 December 2026 at 08:05",
    ],
    [
      "the site's midnight in summer, not that of UTC",
      "2026-06-30T22:00:00Z",
      "2026-06-30T23:05:00Z",
      true,
      "Visit 30 June 2026 at 23:00. Late entry, written 1 July 2026 at 00:05",
    ],
  ])("%s", (_name, visit, entry, isLate, words) => {
    expect(readEntryTimes(new Date(visit), new Date(entry), zone)).toEqual({ isLate, words });
  });
});

describe("history of the text", () => {
  const now = new Date("2026-12-01T10:42:00Z");
  const ago = (seconds: number) => new Date(now.getTime() - seconds * 1000);
  it.each<[string, number, number | null, boolean]>([
    ["nothing kept yet", 2, null, true],
    ["typing on, one kept a moment ago", 3, 20, false],
    ["typing on, a minute since one was kept", 3, 60, true],
    ["a pause of ten seconds", 10, 12, true],
  ])("%s", (_name, savedAgo, keptAgo, kept) => {
    expect(
      isStateKept({ savedAt: ago(savedAgo), lastKeptAt: keptAgo === null ? null : ago(keptAgo), now }),
    ).toBe(kept);
  });
});

describe("text", () => {
  it("drops unknown headings and empty ones, and keeps a space while typing", () => {
    expect(tidyNoteText("session", { plan: " a\r\nb ", history: "  ", salary: "x" })).toEqual({
      plan: "a\nb",
    });
    expect(draftNoteText("session", { plan: "a ", history: "  ", salary: "x" })).toEqual({ plan: "a " });
    expect(isSameText("session", { plan: "a" }, { plan: "a", history: "" })).toBe(true);
    expect(isSameText("session", { plan: "a" }, { plan: "b" })).toBe(false);
  });
  const facts: SignedFacts = {
    noteId: "n1",
    patientId: "p1",
    kind: "session",
    visitAt: "2026-12-01T10:15:00.000Z",
    signedAt: "2026-12-01T10:44:00.000Z",
    signedName: "Hollis Reed",
    registrationNumber: "PH012345",
  };
  it("two different texts never have the same signed form", () => {
    const body = fc.record({
      history: fc.string(),
      examination: fc.string(),
      treatment: fc.string(),
      plan: fc.string(),
    });
    fc.assert(
      fc.property(body, body, (a, b) => {
        const same = isSameText("session", a, b);
        expect(signedForm(facts, a) === signedForm(facts, b)).toBe(same);
      }),
    );
    expect(signedForm(facts, { history: "a\nexamination:1:b" })).not.toBe(
      signedForm(facts, { history: "a", examination: "b" }),
    );
  });
});
