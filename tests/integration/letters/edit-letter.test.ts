import { getLetter, saveLetter, settleSentence } from "@withy/services/letters";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { addDraft, editOf, findSentence, recordPain, therapistOf } from "./letter-steps";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
});
const therapist = () => therapistOf(practice);

describe("saving a letter", () => {
  it("keeps the words, the source and the recipient, and gives a new version", async () => {
    const { letter } = await addDraft(practice);
    const edit = editOf(letter, { "plan:gp": "Please review pain relief in six weeks." });
    const saved = await saveLetter(therapist(), {
      ...edit,
      recipient: { ...edit.recipient, name: "Dr Hanne Pryor", addressLines: ["Quayside Surgery", ""] },
    });
    expect(saved.version).toBe(2);
    expect(saved.recipient).toMatchObject({
      kind: "gp",
      name: "Dr Hanne Pryor",
      addressLines: ["Quayside Surgery"],
    });
    expect(findSentence(saved, "plan:gp")).toMatchObject({
      text: "Please review pain relief in six weeks.",
      assembled: "No action is asked of you.",
      source: { kind: "episode" },
    });
    expect((await getLetter(therapist(), { letterId: letter.id })).sections).toEqual(saved.sections);
  });

  it("answers stale to an old version, with what stands, and changes nothing", async () => {
    const { letter } = await addDraft(practice);
    await saveLetter(therapist(), editOf(letter, { "plan:gp": "First." }));
    const second = saveLetter(therapist(), editOf(letter, { "plan:gp": "Second." }));
    await expect(second).rejects.toMatchObject({ code: "stale", detail: { version: 2 } });
    expect(findSentence(await getLetter(therapist(), { letterId: letter.id }), "plan:gp")?.text).toBe(
      "First.",
    );
  });

  it("of two at once lets one through", async () => {
    const { letter } = await addDraft(practice);
    const results = await Promise.allSettled(
      ["One.", "Two.", "Three."].map((text) => saveLetter(therapist(), editOf(letter, { "plan:gp": text }))),
    );
    expect(results.map((result) => result.status).sort()).toEqual(["fulfilled", "rejected", "rejected"]);
  });

  it("is for its writer alone", async () => {
    const { letter } = await addDraft(practice);
    const colleague = contextFor(practice, "owningTherapist");
    await expect(saveLetter(colleague, editOf(letter))).rejects.toMatchObject({
      code: "refused",
      kind: "not-yours",
      message: expect.stringContaining("Ana Ferreby"),
    });
    await expect(saveLetter(contextFor(practice, "receptionist"), editOf(letter))).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(saveLetter(contextFor(foreign, "therapist"), editOf(letter))).rejects.toMatchObject({
      code: "not-found",
    });
  });

  it.each([
    ["recipient.name", { name: "", addressLines: [], email: null }],
    ["recipient.email", { name: "Dr Pryor", addressLines: [], email: "not an address" }],
  ])("names the field %s that is wrong", async (field, recipient) => {
    const { letter } = await addDraft(practice);
    const saving = saveLetter(therapist(), { ...editOf(letter), recipient });
    await expect(saving).rejects.toMatchObject({ code: "invalid", fields: [{ field }] });
  });
});

describe("a sentence out of date", () => {
  it("takes the record's words", async () => {
    const { letter, episode } = await addDraft(practice);
    await recordPain(practice, episode.id, 2);
    const settled = await settleSentence(therapist(), {
      letterId: letter.id,
      version: 1,
      sentenceId: "scales:pain-rating",
      choice: "take",
    });
    expect(settled.stale).toEqual([]);
    expect(findSentence(settled, "scales:pain-rating")?.text).toContain("Better by 4");
  });

  it("keeps the writer's words only with a reason", async () => {
    const { letter, episode } = await addDraft(practice);
    await recordPain(practice, episode.id, 2);
    const keep = (reason?: string) =>
      settleSentence(therapist(), {
        letterId: letter.id,
        version: 1,
        sentenceId: "scales:pain-rating",
        choice: "keep",
        ...(reason ? { reason } : {}),
      });
    await expect(keep()).rejects.toMatchObject({
      code: "refused",
      kind: "no-reason",
      fields: [{ field: "reason" }],
    });
    const kept = await keep("Taken after a bad night");
    expect(kept.stale).toEqual([]);
    expect(findSentence(kept, "scales:pain-rating")).toMatchObject({
      keptBecause: "Taken after a bad night",
      text: expect.stringContaining("6 out of 10"),
    });
    const detail = (await auditOf(practice, letter.id)).map((row) => JSON.stringify(row.detail)).join();
    expect(detail).not.toContain("bad night");
  });
});
