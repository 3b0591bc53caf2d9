import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { checkWithPlaywright } from "./checks.mjs";
import { freePorts } from "./processes.mjs";
import { main, StartError, step } from "./progress.mjs";
import { appEnvironment, demoPassword, readSecrets, readSettings, root } from "./settings.mjs";
import {
  migrate,
  seedDemo,
  startPrograms,
  startStackDatabase,
  stopStack,
  waitUntilHealthy,
} from "./stack.mjs";

/** A whole Withy with the demonstration practices, on ports and in a folder of its own, until `work` is done. */
export async function withTestStack(work) {
  if (!existsSync(join(root, "apps/staff/.next/BUILD_ID")))
    throw new StartError("The app is not built. Run npx turbo run build first.");
  const dataDir = mkdtempSync(join(existsSync("/dev/shm") ? "/dev/shm" : tmpdir(), "withy-journeys-"));
  const [port, dbPort, fakesPort, smtpPort] = await freePorts(4);
  const settings = readSettings(
    {
      WITHY_PORT: String(port),
      WITHY_DB_PORT: String(dbPort),
      WITHY_FAKES_PORT: String(fakesPort),
      WITHY_SMTP_PORT: String(smtpPort),
      WITHY_DATA_DIR: dataDir,
      WITHY_DEMO: "1",
    },
    "/dev/null",
  );
  const secrets = readSecrets(dataDir);
  let programs = [];
  let database = null;
  const stop = async () => {
    await stopStack(programs, database);
    rmSync(dataDir, { recursive: true, force: true });
  };
  const onSignal = () => stop().then(() => process.exit(1));
  process.once("SIGINT", onSignal).once("SIGTERM", onSignal);
  try {
    await step("Test stack", async () => {
      database = await startStackDatabase(settings, secrets, "fast");
      await migrate(settings, secrets);
      await seedDemo(settings, secrets);
      programs = startPrograms(settings, secrets);
      await waitUntilHealthy(settings, programs);
      return settings.url;
    });
    return await work({
      ...appEnvironment(settings, secrets),
      WITHY_E2E_URL: settings.url,
      WITHY_E2E_MAILBOX: `http://localhost:${fakesPort}`,
      WITHY_E2E_PASSWORD: demoPassword,
    });
  } finally {
    process.off("SIGINT", onSignal).off("SIGTERM", onSignal);
    await stop();
  }
}

export const checkJourneys = (report, files = []) =>
  withTestStack((env) => checkWithPlaywright(report, files, { cwd: root, env }));

if (import.meta.url === pathToFileURL(process.argv[1]).href) {
  await main(async () => {
    const found = await checkJourneys(join(root, "test-results", "journeys.json"), process.argv.slice(2));
    console.log(`${found.passed} passed, ${found.failed} failed`);
    if (found.failed > 0) process.exitCode = 1;
  });
}
