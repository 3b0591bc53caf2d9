import { readEnv } from "./env";
import { startFakes } from "./start-fakes";

const env = readEnv(process.env);
const fakes = await startFakes(env);
console.log(
  `stand-ins ready: mailbox and cards on http://127.0.0.1:${env.httpPort}, mail on port ${env.smtpPort}`,
);

const stop = async () => {
  await fakes.close();
  process.exit(0);
};
process.once("SIGTERM", () => void stop());
process.once("SIGINT", () => void stop());
