import { newId } from "@withy/core/ids";
import { appointments, outboxMessages } from "@withy/db/schema";
import { drainOutbox, enqueueMessage } from "@withy/services/messaging";
import { claimMessages } from "@withy/services/messaging/claim-messages";
import { settleMessage } from "@withy/services/messaging/settle-message";
import { and, eq, inArray } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { enqueueBooking, enqueueReset, officeWith, outboxRow, recordingMail } from "./outbox-support";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  // What other suites have left in this database, in hand or put off, is not this suite's to send.
  await practice.db
    .update(outboxMessages)
    .set({ state: "dropped" })
    .where(inArray(outboxMessages.state, ["waiting", "claimed"]));
});

const drain = (office: ReturnType<typeof officeWith>) => drainOutbox(systemContextFor(practice), office);
const later = (minutes: number) => practice.clock.advance(minutes);

describe("the outbox", () => {
  it("sends a message once, with its row's id, the practice's name and the app's link, and forgets the link", async () => {
    const mail = recordingMail();
    const id = await enqueueReset(practice, "nia@marram.example");
    await drain(officeWith(mail));
    await drain(officeWith(mail));
    expect(mail.sent.length).toBe(1);
    expect(mail.sent[0]).toMatchObject({
      id,
      to: "nia@marram.example",
      from: { name: "Marram Physiotherapy", address: "post@withy.example" },
    });
    expect(mail.sent[0]?.text).toContain("http://localhost:3000/reset/abc_DEF-123");
    expect(await outboxRow(practice, id)).toMatchObject({
      state: "sent",
      attempts: 1,
      payload: {},
      lastError: null,
    });
  });

  it("takes one message for one cause, however often it is caused", async () => {
    const ctx = { ...systemContextFor(practice), practiceId: practice.practiceId };
    const message = {
      template: "password-reset",
      toAddress: "once@marram.example",
      payload: { greetingName: "Nia", path: "/reset/x", validFor: "one hour", invitedBy: null },
      aboutKind: "staff-account",
      aboutId: newId(),
      dedupeKey: "reset:the-same",
    };
    expect(await enqueueMessage(ctx, message)).toBe(await enqueueMessage(ctx, message));
    const mail = recordingMail();
    await drain(officeWith(mail));
    expect(mail.to("once@marram.example").length).toBe(1);
  });

  it("is shared between workers without sending anything twice", async () => {
    const addresses = Array.from({ length: 30 }, (_, i) => `many${i}@marram.example`);
    for (const address of addresses) await enqueueReset(practice, address);
    const mail = recordingMail();
    const worker = async () => {
      while ((await drainOutbox(systemContextFor(practice), { ...officeWith(mail), batch: 3 })) > 0);
    };
    await Promise.all([worker(), worker(), worker()]);
    expect(mail.sent.map((one) => one.to).sort()).toEqual([...addresses].sort());
  });

  it("loses nothing when a worker is killed between sending and marking, and repeats under the same id", async () => {
    const id = await enqueueReset(practice, "killed@marram.example");
    // A worker that dies after the mail has gone never settles: its claim simply stays.
    const claimed = await claimMessages(systemContextFor(practice), "worker-killed", 20);
    expect(claimed.map((row) => row.id)).toContain(id);
    const mail = recordingMail();
    await drain(officeWith(mail));
    expect(mail.to("killed@marram.example")).toEqual([]);
    later(6);
    await drain(officeWith(mail));
    expect(mail.to("killed@marram.example").map((one) => one.id)).toEqual([id]);
    expect(await outboxRow(practice, id)).toMatchObject({ state: "sent", attempts: 2 });
  });

  it("lets a worker that was thought dead change nothing once another has taken over", async () => {
    const id = await enqueueReset(practice, "slow@marram.example");
    const [slow] = await claimMessages(systemContextFor(practice), "worker-slow", 20);
    later(6);
    await drain(officeWith(recordingMail()));
    if (slow)
      await settleMessage(systemContextFor(practice), slow, { outcome: "refused", reason: "smtp-550" });
    expect(await outboxRow(practice, id)).toMatchObject({ state: "sent", lastError: null });
  });

  it("tries again later and later, then gives up where it can be seen", async () => {
    const id = await enqueueReset(practice, "never@marram.example");
    const mail = recordingMail(() => ({ outcome: "try-later", reason: "smtp-451" }));
    const gaps: number[] = [];
    for (let tries = 0; tries < 20; tries += 1) {
      await drain(officeWith(mail));
      const row = await outboxRow(practice, id);
      if (row.state === "failed") break;
      gaps.push((row.dueAt.getTime() - practice.clock.now().getTime()) / 60_000);
      await drain(officeWith(mail));
      practice.clock.set(row.dueAt);
    }
    expect(gaps).toEqual([1, 5, 15, 60, 240, 720, 1440]);
    expect(mail.to("never@marram.example").length).toBe(8);
    expect(await outboxRow(practice, id)).toMatchObject({
      state: "failed",
      attempts: 8,
      lastError: "smtp-451",
    });
  });

  it("gives up at once where the address is refused", async () => {
    const id = await enqueueReset(practice, "refused@marram.example");
    await drain(officeWith(recordingMail(() => ({ outcome: "refused", reason: "smtp-550" }))));
    expect(await outboxRow(practice, id)).toMatchObject({
      state: "failed",
      attempts: 1,
      lastError: "smtp-550",
    });
  });

  it("survives a message that cannot be put together, tells of it without personal data, and sends the next", async () => {
    const ctx = { ...systemContextFor(practice), practiceId: practice.practiceId };
    const bad = await enqueueMessage(ctx, {
      template: "no-such-template",
      toAddress: "bad@marram.example",
      payload: {},
      aboutKind: "nothing",
      aboutId: newId(),
      dedupeKey: `bad:${newId()}`,
    });
    await enqueueReset(practice, "next@marram.example");
    const mail = recordingMail();
    const faults: string[] = [];
    await drainOutbox(systemContextFor(practice), {
      ...officeWith(mail),
      onFault: (fault) => faults.push(fault.template),
    });
    expect(faults).toEqual(["no-such-template"]);
    expect(mail.to("next@marram.example").length).toBe(1);
    expect(await outboxRow(practice, bad)).toMatchObject({ state: "waiting", lastError: "fault" });
  });
});

describe("a message about a visit", () => {
  const inDays = (days: number, hour = 10) => new Date(Date.UTC(2027, 0, 4 + days, hour));
  const change = (id: string, to: Partial<typeof appointments.$inferInsert>) =>
    practice.db
      .update(appointments)
      .set(to)
      .where(and(eq(appointments.practiceId, practice.practiceId), eq(appointments.id, id)));

  it("goes with its calendar file while the visit stands", async () => {
    const { messageId } = await enqueueBooking(practice, "stands@post.example", inDays(1));
    const mail = recordingMail();
    await drain(officeWith(mail));
    expect(mail.to("stands@post.example")[0]?.calendar?.method).toBe("REQUEST");
    expect(mail.to("stands@post.example")[0]?.subject).toBe(
      "Your appointment on Tuesday 5 January 2027 at 10am",
    );
    expect((await outboxRow(practice, messageId)).state).toBe("sent");
  });

  it.each([
    ["was cancelled", { state: "cancelled" as const }],
    ["was moved", { startsAt: inDays(2, 15), endsAt: inDays(2, 16) }],
  ])("does not go where the visit %s before it was sent", async (_, to) => {
    const { appointmentId, messageId } = await enqueueBooking(practice, "gone@post.example", inDays(2));
    await change(appointmentId, to);
    const mail = recordingMail();
    await drain(officeWith(mail));
    expect(mail.to("gone@post.example")).toEqual([]);
    expect(await outboxRow(practice, messageId)).toMatchObject({ state: "dropped", lastError: "superseded" });
  });

  it("does not go where the visit is already past", async () => {
    const { messageId } = await enqueueBooking(practice, "past@post.example", inDays(3));
    practice.clock.set(inDays(3, 12));
    await drain(officeWith(recordingMail()));
    expect((await outboxRow(practice, messageId)).state).toBe("dropped");
  });
});
