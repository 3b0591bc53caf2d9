import { hostname } from "node:os";
import { systemClock } from "@withy/core/clock";
import { newId } from "@withy/core/ids";
import { connect } from "@withy/services/database";
import { openMail } from "@withy/services/messaging";
import { pino } from "pino";
import { readEnv } from "./env";
import { runWorker } from "./run-worker";

const env = readEnv(process.env);
const log = pino({ level: env.logLevel, base: { program: "worker" } });
const connection = connect(env.databaseUrl, { connectionLimit: 5 });
const mail = openMail(env.smtp);

/** Name and message only; a failed query's own message carries its values, so of that only the error number is kept. */
function describe(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { name: typeof error };
  if (error.cause instanceof Error && "errno" in error.cause)
    return { name: "query failed", errno: error.cause.errno };
  return { name: error.name, message: error.message };
}

const worker = runWorker({
  workerId: `${hostname().slice(0, 20)}-${process.pid}`,
  mail,
  fromAddress: env.fromAddress,
  appUrl: env.appUrl,
  jobHandlers: {},
  newContext: () => ({ clock: systemClock, db: connection.db, requestId: newId() }),
  onFault: ({ messageId, template, error }) =>
    log.error({ messageId, template, error: describe(error) }, "message failed"),
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
