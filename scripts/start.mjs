import { join } from "node:path";
import { checkDisk, checkNode, ensurePackages } from "./machine.mjs";
import { endRecorded, findRunning, forgetRunning, isPortFree, recordRunning } from "./processes.mjs";
import { main, StartError, seconds, step } from "./progress.mjs";
import { demoPassword, readSecrets, readSettings, root } from "./settings.mjs";
import {
  describeEnd,
  migrate,
  seedDemo,
  startPrograms,
  startStackDatabase,
  stopStack,
  waitUntilHealthy,
} from "./stack.mjs";
import { buildApp, installDependencies } from "./workspace.mjs";

const isDev = process.argv.includes("--dev");
const since = performance.now();

async function refuseSecondStart({ dataDir, url }) {
  const running = findRunning(dataDir);
  if (running.some(({ name }) => name === "start")) {
    throw new StartError(`Withy already runs from this folder, at ${url}. Use npm stop to end it.`);
  }
  if (running.length > 0) await endRecorded(running);
  forgetRunning(dataDir);
}

async function checkPorts({ port, dbPort, fakesPort, smtpPort, demo }) {
  const standIns = demo ? { WITHY_FAKES_PORT: fakesPort, WITHY_SMTP_PORT: smtpPort } : {};
  const wanted = { WITHY_PORT: port, WITHY_DB_PORT: dbPort, ...standIns };
  for (const [name, number] of Object.entries(wanted)) {
    if (await isPortFree(number)) continue;
    throw new StartError(
      `Port ${number} is taken by another program. Choose another with ${name}, for example ${name}=${number + 10} npm start.`,
    );
  }
}

function sayReady({ url, fakesPort, demo, dataDir }) {
  console.log(`\nWithy is ready after ${seconds(since)}: ${url}`);
  if (demo) {
    console.log(`\nDemonstration sign-ins, all with the password ${demoPassword}`);
    console.log("  owner@marram.example         the owner, who also treats");
    console.log("  therapist@marram.example     a therapist");
    console.log("  reception@marram.example     the front desk at Saltgate");
    console.log("  accounts@marram.example      the bookkeeper");
    console.log("  owner@cairnfirth.example     the owner of another practice");
    console.log(`\nMail, texts and card payments stay on this machine: http://localhost:${fakesPort}`);
  }
  if (!demo)
    console.log("The first practice is laid down with npm run new-practice, which says what it needs.");
  console.log(`Logs are in ${join(dataDir, "logs")}. Ctrl-C stops everything.`);
}

async function start() {
  checkNode();
  const settings = readSettings();
  await refuseSecondStart(settings);
  await checkPorts(settings);
  checkDisk(settings.dataDir, 500);
  console.log(`Starting Withy (data in ${settings.dataDir})`);
  const secrets = readSecrets(settings.dataDir);
  const running = { programs: [], database: null };
  let isStopping = false;
  const stop = async (exitCode) => {
    if (isStopping) return;
    isStopping = true;
    console.log("\nStopping");
    await stopStack(running.programs, running.database);
    forgetRunning(settings.dataDir);
    process.exit(exitCode);
  };
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => stop(0));
  recordRunning(settings.dataDir, []);
  try {
    await bringUp(settings, secrets, running);
    if (isStopping) return;
    sayReady(settings);
    const ended = await Promise.race(
      [...running.programs, running.database].map((one) => one.ended.then(() => one)),
    );
    if (!isStopping) throw new StartError(describeEnd(ended));
  } catch (error) {
    if (isStopping) return;
    console.error(`\n${error instanceof StartError ? error.message : error.stack}`);
    await stop(1);
  }
}

async function bringUp(settings, secrets, running) {
  await step("Debian packages", () => ensurePackages(["mariadb-server-core", "mariadb-client"]));
  await step("Node packages", () => {
    checkDisk(root, 300);
    return installDependencies();
  });
  if (!isDev) await step("Build", () => buildApp());
  await step("Database", async () => {
    running.database = await startStackDatabase(settings, secrets, "durable");
    recordRunning(settings.dataDir, [running.database]);
  });
  await step("Tables", () => migrate(settings, secrets));
  if (settings.demo) await step("Demonstration practices", () => seedDemo(settings, secrets));
  await step("App, worker and stand-ins", async () => {
    running.programs = startPrograms(settings, secrets, { isDev });
    recordRunning(settings.dataDir, [...running.programs, running.database]);
    await waitUntilHealthy(settings, running.programs);
  });
}

await main(start);
