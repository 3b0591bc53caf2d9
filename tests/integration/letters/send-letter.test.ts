import { newId } from "@withy/core/ids";
import { consents, letterDeliveries } from "@withy/db/schema";
import {
  getLetter,
  getLetterPdf,
  listLetters,
  saveLetter,
  sendLetter,
  signLetter,
} from "@withy/services/letters";
import { drainOutbox } from "@withy/services/messaging";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor, systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { officeWith, recordingMail } from "../messaging/outbox-support";
import { addDraft, addSigned, editOf, therapistOf, tokenIn } from "./letter-steps";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
});
const therapist = () => therapistOf(practice);
const toGp = (letterId: string) => ({ letterId, to: "recipient" as const, channel: "email" as const });
const system = () => systemContextFor(practice);

async function drain(mail = recordingMail()) {
  while ((await drainOutbox(system(), { ...officeWith(mail), batch: 100 })) > 0);
  return mail;
}

describe("sending a letter", () => {
  it("puts a private link into the doctor's mail, names no patient in it, and follows the delivery", async () => {
    const { letter, patient } = await addSigned(practice);
    const waiting = await sendLetter(therapist(), toGp(letter.id));
    expect(waiting.deliveries).toMatchObject([
      { channel: "email", toName: "Dr Ruth Ellery", toAddress: "letters@lantern.example", state: "waiting" },
    ]);
    const mail = (await drain()).to("letters@lantern.example").at(-1);
    expect(mail?.subject).toBe(`A letter from Marram Physiotherapy, reference ${letter.reference}`);
    expect(`${mail?.subject}${mail?.text}${mail?.html}`).not.toContain(patient.familyName);
    expect(`${mail?.text}`).not.toMatch(/hip|pain|osteo/i);
    expect(mail?.attachments).toEqual([]);
    expect((await getLetter(therapist(), { letterId: letter.id })).deliveries[0]).toMatchObject({
      state: "sent",
      firstOpenedAt: null,
    });
  });

  it("keeps the link nowhere once it has gone: neither in the outbox nor beside the letter", async () => {
    const { letter } = await addSigned(practice);
    await sendLetter(therapist(), toGp(letter.id));
    const token = tokenIn(JSON.stringify((await messagesAbout(practice, letter.id))[0]?.payload));
    await drain();
    const kept = JSON.stringify([
      await messagesAbout(practice, letter.id),
      await practice.db
        .select()
        .from(letterDeliveries)
        .where(
          and(eq(letterDeliveries.practiceId, practice.practiceId), eq(letterDeliveries.letterId, letter.id)),
        ),
      await auditOf(practice, letter.id),
    ]);
    expect(token).toHaveLength(43);
    expect(kept).not.toContain(token);
  });

  it("sends once for one press, and again for another", async () => {
    const { letter } = await addSigned(practice);
    const ctx = { ...therapist(), idempotencyKey: `press-${newId()}` };
    await Promise.all([sendLetter(ctx, toGp(letter.id)), sendLetter(ctx, toGp(letter.id))]);
    expect((await messagesAbout(practice, letter.id)).length).toBe(1);
    await sendLetter({ ...ctx, idempotencyKey: `press-${newId()}` }, toGp(letter.id));
    expect((await messagesAbout(practice, letter.id)).length).toBe(2);
  });

  it("sends a copy to the patient, and notes what was posted", async () => {
    const { letter, patient } = await addSigned(practice);
    await sendLetter(therapist(), { letterId: letter.id, to: "patient", channel: "email" });
    const after = await sendLetter(therapist(), { letterId: letter.id, to: "patient", channel: "print" });
    const sent = after.deliveries.map((one) => [one.channel, one.toAddress, one.state]);
    expect(sent).toEqual(
      expect.arrayContaining([
        ["email", patient.email, "waiting"],
        ["print", "3 Net Loft Row, Easterhaven, ZZ1 7GH", null],
      ]),
    );
  });

  it("refuses where the reader has no e-mail address, and lets it be posted", async () => {
    const { letter } = await addDraft(practice);
    const edit = editOf(letter);
    const saved = await saveLetter(therapist(), { ...edit, recipient: { ...edit.recipient, email: "" } });
    await signLetter(therapist(), { letterId: letter.id, version: saved.version });
    await expect(sendLetter(therapist(), toGp(letter.id))).rejects.toMatchObject({ kind: "no-address" });
    const posted = await sendLetter(therapist(), { letterId: letter.id, to: "recipient", channel: "print" });
    expect(posted.deliveries.map((one) => one.channel)).toEqual(["print"]);
  });

  it("refuses a draft and what the patient has forbidden, and writes nothing", async () => {
    const { letter: draft } = await addDraft(practice);
    await expect(sendLetter(therapist(), toGp(draft.id))).rejects.toMatchObject({
      kind: "letter-not-signed",
    });
    const { letter, patient } = await addSigned(practice);
    const consent = {
      practiceId: practice.practiceId,
      patientId: patient.id,
      kind: "letter-to-gp" as const,
      wordingVersion: "1",
      recordedBy: practice.staff.receptionist.id,
    };
    await practice.db.insert(consents).values({
      ...consent,
      id: newId(),
      givenAt: new Date("2026-11-01T09:00:00Z"),
      withdrawnAt: new Date("2026-11-20T09:00:00Z"),
    });
    await expect(sendLetter(therapist(), toGp(letter.id))).rejects.toMatchObject({
      kind: "consent-withdrawn",
    });
    expect(await messagesAbout(practice, letter.id)).toEqual([]);
    await practice.db
      .insert(consents)
      .values({ ...consent, id: newId(), givenAt: new Date("2026-11-25T09:00:00Z") });
    expect((await sendLetter(therapist(), toGp(letter.id))).deliveries.length).toBe(1);
  });

  it("shows what failed and why, on the letter and in the list", async () => {
    const { letter, patient } = await addSigned(practice);
    const standing = async () =>
      (await listLetters(therapist(), { patientId: patient.id })).rows.find((row) => row.id === letter.id);
    expect(await standing()).toMatchObject({ standing: "Signed, not sent", needsAttention: true });
    await sendLetter(therapist(), toGp(letter.id));
    expect(await standing()).toMatchObject({ standing: "Waiting to go", needsAttention: false });
    await drain(recordingMail(() => ({ outcome: "refused", reason: "smtp-550" })));
    expect(await standing()).toMatchObject({ standing: "Not sent", needsAttention: true });
    const [delivery] = (await getLetter(therapist(), { letterId: letter.id })).deliveries;
    expect(delivery).toMatchObject({
      state: "failed",
      problem: expect.stringContaining("Check it with the person"),
    });
    await sendLetter(therapist(), toGp(letter.id));
    await drain();
    expect(await standing()).toMatchObject({ standing: "Sent", needsAttention: false });
  });

  it("is for therapists who may reach the site", async () => {
    const { letter } = await addSigned(practice);
    await expect(sendLetter(contextFor(practice, "receptionist"), toGp(letter.id))).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(sendLetter(contextFor(foreign, "therapist"), toGp(letter.id))).rejects.toMatchObject({
      code: "not-found",
    });
    expect(
      (await sendLetter(contextFor(practice, "owningTherapist"), toGp(letter.id))).deliveries.length,
    ).toBe(1);
  });
});

describe("the letter as a file", () => {
  it("is a PDF, its reading is audited, and it is not there for others", async () => {
    const { letter } = await addSigned(practice);
    const file = await getLetterPdf(therapist(), { letterId: letter.id });
    expect(file.filename).toBe(`letter-${letter.reference}.pdf`);
    expect(file.bytes.equals((await getLetterPdf(therapist(), { letterId: letter.id })).bytes)).toBe(true);
    expect((await auditOf(practice, letter.id)).filter((row) => row.action === "letter.printed").length).toBe(
      2,
    );
    await expect(
      getLetterPdf(contextFor(foreign, "therapist"), { letterId: letter.id }),
    ).rejects.toMatchObject({ code: "not-found" });
    await expect(
      getLetterPdf(contextFor(practice, "accounts"), { letterId: letter.id }),
    ).rejects.toMatchObject({ code: "forbidden" });
  });
});

describe("the list of letters", () => {
  it("shows the practice's own, newest first, by state and by page", async () => {
    const one = await buildPractice();
    const ctx = therapistOf(one);
    const first = await addSigned(one);
    one.clock.advance(1);
    const second = await addDraft(one);
    const all = await listLetters(ctx, {});
    expect(all.rows.map((row) => row.id)).toEqual([second.letter.id, first.letter.id]);
    expect((await listLetters(ctx, { state: "draft" })).rows.map((row) => row.id)).toEqual([
      second.letter.id,
    ]);
    const page = await listLetters(ctx, { page: 2, pageSize: 1 });
    expect([page.total, page.rows[0]?.id]).toEqual([2, first.letter.id]);
    const elsewhere = contextFor(one, "therapist", {
      roles: [{ role: "therapist", siteId: one.sites.tollhouse.id }],
    });
    expect((await listLetters(elsewhere, {})).rows).toEqual([]);
    await expect(listLetters(contextFor(one, "owner"), {})).rejects.toMatchObject({ code: "forbidden" });
  });
});
