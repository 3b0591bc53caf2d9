import type { LetterSection } from "@withy/contracts/letters";
import { describe, expect, it } from "vitest";
import { assembleDischargeLetter } from "./assemble-discharge-letter";
import { checkSend, checkSign, type LetterToCheck, letterChecks, otherSideMentions } from "./check-letter";
import { staleSentences } from "./compare-with-record";
import { keepAgainstRecord, mergeEdits, takeFromRecord } from "./merge-edits";
import { hipFacts } from "./scenario.test-data";

const draft = assembleDischargeLetter(hipFacts);
const asEdited = (sections: readonly LetterSection[]) =>
  sections.map(({ key, sentences }) => ({
    key,
    sentences: sentences.map(({ id, text, actor }) => ({ id, text, actor })),
  }));
const find = (sections: readonly LetterSection[], id: string) =>
  sections.flatMap((s) => s.sentences).find((s) => s.id === id);

describe("the writer's edits", () => {
  it("change nothing where nothing was typed", () => {
    expect(mergeEdits(draft, asEdited(draft))).toEqual(draft);
  });

  it("keep the source of a sentence whose words were changed", () => {
    const edited = asEdited(draft).map((section) => ({
      ...section,
      sentences: section.sentences.map((s) =>
        s.id === "scales:pain" ? { ...s, text: "Pain is half of what it was." } : s,
      ),
    }));
    const sentence = find(mergeEdits(draft, edited), "scales:pain");
    expect(sentence).toMatchObject({ text: "Pain is half of what it was.", source: { kind: "measure" } });
    expect(sentence?.assembled).toContain("out of 10");
  });

  it("call a new sentence the writer's own, whatever source or id it came with", () => {
    const own = {
      id: "scales:made-up",
      text: "I trust this figure.",
      actor: "gp" as const,
      source: { kind: "note" },
    };
    const edited = [
      ...asEdited(draft),
      { key: "scales" as const, sentences: [own, { ...own, text: "And this." }] },
    ];
    const typed = mergeEdits(draft, edited)
      .find((s) => s.key === "scales")
      ?.sentences.slice(-2);
    expect(typed).toEqual([
      {
        id: "scales:typed-1",
        text: "I trust this figure.",
        source: null,
        assembled: null,
        actor: null,
        keptBecause: null,
      },
      {
        id: "scales:typed-2",
        text: "And this.",
        source: null,
        assembled: null,
        actor: null,
        keptBecause: null,
      },
    ]);
  });

  it("remember a sourced sentence that was left out, and forget one that was typed", () => {
    const with1 = mergeEdits(draft, [
      ...asEdited(draft),
      { key: "plan", sentences: [{ id: "new", text: "Mine.", actor: "gp" }] },
    ]);
    const edited = asEdited(with1).map((s) => ({
      ...s,
      sentences: s.sentences.filter((x) => x.id !== "plan:typed-1" && x.id !== "scales:pain"),
    }));
    const merged = mergeEdits(with1, edited);
    expect(find(merged, "scales:pain")).toMatchObject({ text: "", source: { kind: "measure" } });
    expect(find(merged, "plan:typed-1")).toBeUndefined();
  });

  it("put no sentence in twice", () => {
    const section = asEdited(draft).find((s) => s.key === "scales");
    const merged = mergeEdits(draft, [...asEdited(draft), ...(section ? [section] : [])]);
    const ids = merged.flatMap((s) => s.sentences.map((x) => x.id));
    expect(new Set(ids).size).toBe(ids.length);
  });
});

describe("a sentence that is out of date", () => {
  const [pain, chair] = hipFacts.measures;
  if (!pain || !chair) throw new Error("the scenario has two measures");
  const fresh = assembleDischargeLetter({
    ...hipFacts,
    measures: [{ ...pain, last: { ...pain.last, score: "2" } }],
  });

  it("takes the record's words, is kept with a reason, or goes with its fact", () => {
    const taken = takeFromRecord(draft, fresh, "scales:pain");
    expect(find(taken ?? [], "scales:pain")?.text).toContain("2 on 1 December 2026");
    const kept = keepAgainstRecord(draft, fresh, "scales:pain", "Scored after a bad night");
    expect(find(kept ?? [], "scales:pain")).toMatchObject({
      text: find(draft, "scales:pain")?.text,
      keptBecause: "Scored after a bad night",
    });
    expect(staleSentences(kept ?? [], fresh).map((s) => s.id)).toEqual(["scales:chair-stand-30"]);
    expect(
      find(takeFromRecord(draft, fresh, "scales:chair-stand-30") ?? [], "scales:chair-stand-30"),
    ).toBeUndefined();
  });

  it("that nobody knows is refused", () => {
    expect(takeFromRecord(draft, fresh, "scales:nothing")).toBeNull();
    expect(keepAgainstRecord(draft, fresh, "scales:nothing", "why")).toBeNull();
  });

  it("that the draft lacks is put under its heading", () => {
    const without = draft.filter((section) => section.key !== "scales");
    const taken = takeFromRecord(without, draft, "scales:pain");
    expect(taken?.map((s) => s.key)).toEqual(draft.map((s) => s.key));
  });
});

describe("before a letter is signed", () => {
  const letter: LetterToCheck = {
    state: "draft",
    authorId: "nia",
    authorName: "Nia Prosser",
    recipientName: "Dr Hanne Pryor",
    sections: draft,
    side: "left",
    staleCount: 0,
    unsignedNotes: 0,
    visitsBooked: 0,
  };
  const nia = { id: "nia", registrationNumber: "PH100201" };
  const planWithout = (actor: string) =>
    draft.map((s) =>
      s.key === "plan" ? { ...s, sentences: s.sentences.filter((x) => x.actor !== actor) } : s,
    );

  it("nothing stands in the way of a whole one", () => {
    expect(checkSign(letter, nia)).toBeNull();
    expect(letterChecks(letter).every((check) => check.isOk)).toBe(true);
  });

  it.each<[string, Partial<LetterToCheck>, Partial<typeof nia> | { registrationNumber: null }]>([
    ["letter-signed", { state: "signed" }, {}],
    ["not-yours", { authorId: "ana" }, {}],
    ["not-registered", {}, { registrationNumber: null }],
    ["letter-recipient", { recipientName: " " }, {}],
    ["letter-diagnosis", { sections: draft.filter((s) => s.key !== "diagnoses") }, {}],
    ["letter-gp-action", { sections: planWithout("gp") }, {}],
    ["letter-patient-action", { sections: planWithout("patient") }, {}],
    ["letter-stale", { staleCount: 2 }, {}],
    ["letter-notes", { unsignedNotes: 1 }, {}],
  ])("%s stops it", (kind, changed, signer) => {
    expect(checkSign({ ...letter, ...changed }, { ...nia, ...signer })?.kind).toBe(kind);
  });

  it("the other side and booked visits are pointed out but do not stop it", () => {
    const sections = draft.map((s) =>
      s.key === "findings"
        ? { ...s, sentences: s.sentences.map((x) => ({ ...x, text: "Right hip stiff." })) }
        : s,
    );
    const changed = { ...letter, sections, visitsBooked: 1 };
    expect(
      letterChecks(changed)
        .filter((check) => !check.isOk)
        .map((check) => check.key),
    ).toEqual(["side", "visits"]);
    expect(checkSign(changed, nia)).toBeNull();
  });

  it.each([
    ["left", "The right knee was spared; upright posture, all right.", 2],
    ["right", "Left hip, left knee", 2],
    ["both", "Left and right", 0],
    ["none", "Left and right", 0],
  ] as const)("counts words of the other side than %s in %s", (side, text, count) => {
    const one = { ...draft[0], sentences: [{ ...draft[0]?.sentences[0], text }] } as LetterSection;
    expect(otherSideMentions([one], side)).toBe(count);
  });
});

describe("sending", () => {
  const sending = {
    state: "signed",
    channel: "email",
    address: "a@b.example",
    whose: "the surgery",
    isRefusedByPatient: false,
  } as const;
  it.each([
    [{}, null],
    [{ state: "draft" as const }, "letter-not-signed"],
    [{ isRefusedByPatient: true }, "consent-withdrawn"],
    [{ address: null }, "no-address"],
    [{ address: null, channel: "print" as const }, null],
  ])("with %j answers %s", (changed, kind) => {
    expect(checkSend({ ...sending, ...changed })?.kind ?? null).toBe(kind);
  });
});
