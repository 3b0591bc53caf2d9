import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { createServer, type Server } from "node:net";
import { fileURLToPath } from "node:url";
import { systemClock } from "@withy/core/clock";
import { newId } from "@withy/core/ids";
import { dayOf } from "@withy/core/zoned-time";
import { outboxMessages, prices, workerHeartbeats } from "@withy/db/schema";
import { startFakes } from "@withy/fakes/start-fakes";
import { getDraftingJob, listToIssue, startDrafting } from "@withy/services/billing";
import { drainOutbox } from "@withy/services/messaging";
import { eq, like } from "drizzle-orm";
import { afterEach, beforeAll, expect, it } from "vitest";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { attend } from "../billing/invoice-steps";
import { enqueueReset, officeWith, outboxRow, recordingMail } from "./outbox-support";

let practice: TestPractice;
const running: ChildProcess[] = [];
const cwd = fileURLToPath(new URL("../../../apps/worker", import.meta.url));

beforeAll(async () => {
  practice = await buildPractice();
  const ctx = { ...systemContextFor(practice), clock: systemClock };
  while ((await drainOutbox(ctx, { ...officeWith(recordingMail()), batch: 200 })) > 0);
});
afterEach(() => {
  for (const child of running.splice(0)) if (child.exitCode === null) child.kill("SIGKILL");
});

async function startWorker(smtpPort: number): Promise<ChildProcess> {
  const env = {
    ...process.env,
    NEXTAUTH_URL: "http://localhost:3000",
    WITHY_SMTP_HOST: "127.0.0.1",
    WITHY_SMTP_PORT: String(smtpPort),
  };
  const child = spawn(process.execPath, ["--import", "tsx", "src/main.ts"], {
    cwd,
    env,
    stdio: ["ignore", "pipe", "inherit"],
  });
  running.push(child);
  for await (const chunk of child.stdout ?? []) if (String(chunk).includes("worker ready")) break;
  child.stdout?.resume();
  return child;
}

/** A mail server that takes a connection and never says a word, so that a sending hangs in the middle. */
async function silentServer(): Promise<{ server: Server; port: number }> {
  const server = createServer(() => {});
  server.listen(0, "127.0.0.1");
  await once(server, "listening");
  const address = server.address();
  return { server, port: typeof address === "object" && address ? address.port : 0 };
}

const heartsOf = (child: ChildProcess) =>
  practice.db
    .select()
    .from(workerHeartbeats)
    .where(like(workerHeartbeats.workerId, `%-${child.pid}`));

it("delivers what a killed worker had in hand, under the same Message-ID", async () => {
  const { server, port } = await silentServer();
  const id = await enqueueReset(practice, "killed-for-real@marram.example");
  const first = await startWorker(port);
  await expect.poll(async () => (await outboxRow(practice, id)).state, { timeout: 20_000 }).toBe("claimed");
  first.kill("SIGKILL");
  await once(first, "exit");
  server.close();
  expect((await outboxRow(practice, id)).state).toBe("claimed");
  // What the clock would do in five minutes.
  await practice.db
    .update(outboxMessages)
    .set({ claimedAt: new Date(Date.now() - 6 * 60_000) })
    .where(eq(outboxMessages.id, id));

  const fakes = await startFakes({ httpPort: 0, smtpPort: 0, dataDir: null });
  const second = await startWorker(fakes.smtpPort);
  await expect.poll(async () => (await outboxRow(practice, id)).state, { timeout: 20_000 }).toBe("sent");
  expect(fakes.store.list("killed-for-real@marram.example").map((mail) => mail.parsed.messageId)).toEqual([
    `<${id}@withy.example>`,
  ]);
  expect((await heartsOf(second)).length).toBe(1);

  second.kill("SIGTERM");
  const [code] = await once(second, "exit");
  expect(code).toBe(0);
  expect(await heartsOf(second)).toEqual([]);
  await fakes.close();
}, 90_000);

it("does the jobs that were started, every kind that the house knows", async () => {
  const { id: patientId } = await addPatient(practice);
  // The worker goes by the machine's own clock, so the visit and its price do too.
  const now = { clock: systemClock };
  await attend(practice, patientId, dayOf(new Date(Date.now() - 2 * 86_400_000), practice.zone));
  const serviceId = practice.services.followUp.id;
  await practice.db.insert(prices).values({
    ...{ practiceId: practice.practiceId, id: newId(), serviceId, siteId: practice.sites.saltgate.id },
    ...{ amountPence: 5300, vatTreatment: "exempt", validFrom: "2020-01-01" },
  });
  const accounts = contextFor(practice, "accounts", now);
  const { id: jobId } = await startDrafting(accounts, { patientId });
  const worker = await startWorker(9);
  await expect
    .poll(() => getDraftingJob(accounts, { jobId }), { timeout: 20_000 })
    .toMatchObject({ state: "done", progressDone: 1, progressTotal: 1, result: { visitsDrafted: 1 } });
  const { drafts } = await listToIssue(accounts, { patientId });
  expect(drafts).toMatchObject([{ visits: 1, totalPence: 5300 }]);
  worker.kill("SIGTERM");
  await once(worker, "exit");
}, 90_000);
