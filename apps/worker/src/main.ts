import { hostname } from "node:os";
import { systemClock } from "@withy/core/clock";
import { newId } from "@withy/core/ids";
import { connect } from "@withy/services/database";
import { jobHandlers } from "@withy/services/job-handlers";
import { openMail } from "@withy/services/messaging";
import { pino } from "pino";
import { readEnv } from "./env";
import { runWorker } from "./run-worker";

const env = readEnv(process.env);
const log = pino({ level: env.logLevel, base: { program: "worker" } });
const connection = connect(env.databaseUrl, { connectionLimit: 5 });
const mail = openMail(env.smtp);

/** Name and message only. A failed statement comes as a `DatabaseError`, without its text and values. */
function describe(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { name: typeof error };
  return { name: error.name, message: error.message };
}

const worker = runWorker({
  workerId: `${hostname().slice(0, 20)}-${process.pid}`,
  mail,
  fromAddress: env.fromAddress,
  appUrl: env.appUrl,
  jobHandlers,
  newContext: () => ({ clock: systemClock, db: connection.db, requestId: newId() }),
  onFault: ({ messageId, template, error }) =>
    log.error({ messageId, template, error: describe(error) }, "message failed"),
  onJobFault: ({ jobId, kind, error }) => log.error({ jobId, kind, error: describe(error) }, "job failed"),
  onTrouble: (what, error) => log.error({ what, error: describe(error) }, "worker in trouble, trying again"),
});
log.info("worker ready");

let stopping = false;
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  await worker
    .stop()
    .catch((error: unknown) => log.error({ error: describe(error) }, "could not stop in good order"));
  mail.close();
  await connection.close();
  process.exit(0);
}
process.on("SIGTERM", () => void stop());
process.on("SIGINT", () => void stop());
