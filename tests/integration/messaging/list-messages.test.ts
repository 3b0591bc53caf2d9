import { newId } from "@withy/core/ids";
import { patients } from "@withy/db/schema";
import { countMessages, drainOutbox, listMessages, sendMessageAgain } from "@withy/services/messaging";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor, systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { enqueueBooking, enqueueReset, officeWith, outboxRow, recordingMail } from "./outbox-support";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
  await drain();
});
const desk = () => contextFor(practice, "receptionist");
async function drain(mail = recordingMail()) {
  while ((await drainOutbox(systemContextFor(practice), { ...officeWith(mail), batch: 100 })) > 0);
  return mail;
}
const soon = new Date("2026-12-03T10:00:00Z");
const refusing = () => recordingMail(() => ({ outcome: "refused", reason: "smtp-550" }));

describe("the list of messages", () => {
  it("says what waits, what went and what did not and why, without a word of any text", async () => {
    const failed = await enqueueBooking(practice, "refused@post.example", soon);
    await drain(refusing());
    const sent = await enqueueBooking(practice, "fine@post.example", soon);
    await drain();
    const waiting = await enqueueReset(practice, "nia@marram.example");
    const { rows, total } = await listMessages(desk(), {});
    expect(total).toBe(3);
    expect(rows.map((row) => [row.id, row.state, row.canSendAgain])).toEqual([
      [waiting, "waiting", false],
      [sent.messageId, "sent", true],
      [failed.messageId, "failed", true],
    ]);
    expect(rows[2]).toMatchObject({
      template: "booking-confirmed",
      toAddress: "refused@post.example",
      problem: expect.stringContaining("Check it with the person"),
    });
    expect(rows[2]?.patientName).toContain("Perran");
    expect(JSON.stringify(rows)).not.toMatch(/payload|abc_DEF/);
    expect(await countMessages(desk(), {})).toEqual({ waiting: 1, failed: 1 });
    expect((await listMessages(desk(), { state: "failed" })).rows.length).toBe(1);
    expect((await listMessages(desk(), { patientId: sent.patientId })).rows.map((row) => row.id)).toEqual([
      sent.messageId,
    ]);
    expect((await listMessages(desk(), { page: 2, pageSize: 2 })).rows.length).toBe(1);
  });

  it("is the practice's own, for the desk and the owner", async () => {
    expect((await listMessages(contextFor(foreign, "owner"), {})).total).toBe(0);
    expect((await listMessages(contextFor(practice, "owner"), {})).total).toBeGreaterThan(0);
    for (const person of ["therapist", "accounts"] as const) {
      await expect(listMessages(contextFor(practice, person), {})).rejects.toMatchObject({
        code: "forbidden",
      });
    }
  });
});

describe("sending a message again", () => {
  it("starts a failed one over, to the address that the patient has now", async () => {
    const { messageId, patientId } = await enqueueBooking(practice, "old@post.example", soon);
    await drain(refusing());
    await practice.db
      .update(patients)
      .set({ email: "new@post.example" })
      .where(and(eq(patients.practiceId, practice.practiceId), eq(patients.id, patientId)));
    expect(await sendMessageAgain(desk(), { messageId })).toEqual({ messageId });
    const mail = await drain();
    expect(mail.to("new@post.example").map((one) => one.id)).toEqual([messageId]);
    expect((await auditOf(practice, messageId)).map((row) => row.action)).toEqual(["message.sent-again"]);
  });

  it("sends one that went as a new message, once for one press", async () => {
    const { messageId } = await enqueueBooking(practice, "lost@post.example", soon);
    await drain();
    const ctx = { ...desk(), idempotencyKey: `press-${newId()}` };
    const answers = await Promise.all([
      sendMessageAgain(ctx, { messageId }),
      sendMessageAgain(ctx, { messageId }),
    ]);
    expect(answers[0]).toEqual(answers[1]);
    expect(answers[0]?.messageId).not.toBe(messageId);
    expect((await outboxRow(practice, answers[0]?.messageId ?? "")).state).toBe("waiting");
  });

  it("is refused for what waits and for what carried a secret", async () => {
    const waiting = await enqueueReset(practice, "a@marram.example");
    const twice = { messageId: waiting };
    await expect(sendMessageAgain(desk(), twice)).rejects.toMatchObject({
      code: "refused",
      kind: "cannot-repeat",
    });
    await drain();
    await expect(sendMessageAgain(desk(), twice)).rejects.toMatchObject({
      code: "refused",
      kind: "cannot-repeat",
    });
  });

  it("is not for others", async () => {
    const { messageId } = await enqueueBooking(practice, "mine@post.example", soon);
    await expect(sendMessageAgain(contextFor(foreign, "receptionist"), { messageId })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(sendMessageAgain(contextFor(practice, "therapist"), { messageId })).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(sendMessageAgain(desk(), { messageId: newId() })).rejects.toMatchObject({
      code: "not-found",
    });
  });
});
