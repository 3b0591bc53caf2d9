import { spawn } from "node:child_process";
import { existsSync, mkdirSync, openSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { dirname, join } from "node:path";
import { StartError } from "./progress.mjs";

export const pause = (ms) => new Promise((done) => setTimeout(done, ms));
export const lastLines = (text, count = 30) => text.trimEnd().split("\n").slice(-count).join("\n");

/**
 * Runs a command to its end and gives its output; with `show`, the output goes straight to the screen.
 * @param {string} command
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, input?: string, show?: boolean, failure?: string }} options
 * @returns {Promise<string>}
 */
export function run(command, args, { cwd, env, input, show = false, failure } = {}) {
  return new Promise((resolve, reject) => {
    const stdio = show ? ["ignore", "inherit", "inherit"] : ["pipe", "pipe", "pipe"];
    const child = spawn(command, args, { cwd, env, stdio });
    let output = "";
    for (const stream of [child.stdout, child.stderr])
      stream?.setEncoding("utf8").on("data", (text) => (output += text));
    child.stdin?.on("error", () => {});
    child.stdin?.end(input);
    child.on("error", (error) => reject(new StartError(`${command} could not be run: ${error.message}`)));
    child.on("close", (code, signal) => {
      if (code === 0) return resolve(output);
      const said = output.trim() === "" ? "" : `\n${lastLines(output)}`;
      reject(new StartError(`${failure ?? `${command} ${args[0] ?? ""} failed (${signal ?? code})`}${said}`));
    });
  });
}

/** Starts a long-running process of its own group, so that Ctrl-C reaches only us and we stop it in order. */
export function startProcess(name, command, args, { cwd, env, logDir }) {
  mkdirSync(logDir, { recursive: true });
  const logFile = join(logDir, `${name}.log`);
  const log = openSync(logFile, "w");
  const child = spawn(command, args, { cwd, env, stdio: ["ignore", log, log], detached: true });
  const started = { name, child, logFile, pid: child.pid, isStopping: false, hasEnded: false };
  started.ended = new Promise((done) => {
    const end = () => {
      started.hasEnded = true;
      done();
    };
    child.on("exit", end);
    child.on("error", end);
  });
  return started;
}

/** Asks a process to end and waits; after `patience` milliseconds it is ended by force. */
export async function stopProcess(started, patience = 10_000) {
  if (started.hasEnded) return;
  started.isStopping = true;
  started.child.kill("SIGTERM");
  const force = setTimeout(() => started.child.kill("SIGKILL"), patience);
  await started.ended;
  clearTimeout(force);
}

export function isPortFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", () => resolve(false));
    probe.listen({ port, host: "127.0.0.1", exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/** `count` ports that nothing listens on, all different. */
export async function freePorts(count) {
  const probes = await Promise.all(
    Array.from({ length: count }, () => {
      const probe = createServer();
      return new Promise((resolve) => probe.listen(0, "127.0.0.1", () => resolve(probe)));
    }),
  );
  const ports = probes.map((probe) => probe.address().port);
  await Promise.all(probes.map((probe) => new Promise((done) => probe.close(done))));
  return ports;
}

/** When a process began, in clock ticks since boot: tells a living process from a later one with its number. */
function beganAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    return fields[0] === "Z" ? null : fields[19];
  } catch {
    return null;
  }
}

const runningFile = (dataDir) => join(dataDir, "running.json");

export function recordRunning(dataDir, processes) {
  const rows = [{ name: "start", pid: process.pid }, ...processes.map(({ name, pid }) => ({ name, pid }))];
  mkdirSync(dirname(runningFile(dataDir)), { recursive: true });
  writeFileSync(
    runningFile(dataDir),
    JSON.stringify(rows.map((row) => ({ ...row, began: beganAt(row.pid) }))),
  );
}

export const forgetRunning = (dataDir) => rmSync(runningFile(dataDir), { force: true });

/** The recorded processes of this data folder that still live. */
export function findRunning(dataDir) {
  if (!existsSync(runningFile(dataDir))) return [];
  const rows = JSON.parse(readFileSync(runningFile(dataDir), "utf8"));
  return rows.filter(({ pid, began }) => began !== null && beganAt(pid) === began);
}

/** Ends recorded processes in the order app, worker, stand-ins, database. */
export async function endRecorded(rows, patience = 10_000) {
  for (const { pid, began } of rows) {
    if (beganAt(pid) !== began) continue;
    process.kill(pid, "SIGTERM");
    const until = Date.now() + patience;
    while (beganAt(pid) === began && Date.now() < until) await pause(50);
    if (beganAt(pid) === began) process.kill(pid, "SIGKILL");
  }
}
