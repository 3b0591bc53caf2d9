import { readFileSync } from "node:fs";
import { type ClientRequest, get } from "node:http";

export const streamCount = 200;

/** Memory that a process holds, in megabytes. */
function heldBy(pid: number): number {
  const status = readFileSync(`/proc/${pid}/status`, "utf8");
  return Number(/^VmRSS:\s+(\d+) kB/m.exec(status)?.[1] ?? Number.NaN) / 1024;
}

function openStream(url: string, cookie: string): Promise<ClientRequest> {
  return new Promise((resolve, reject) => {
    const request = get(url, { headers: { cookie }, agent: false }, (answer) => {
      if (answer.statusCode !== 200) return reject(new Error(`${url} answered ${answer.statusCode}.`));
      answer.once("data", () => resolve(request)).resume();
      // Its own end: the request is destroyed when all is measured.
      answer.on("error", () => {});
    });
    request.on("error", reject);
  });
}

/** By how many megabytes a process grows with so many live streams open for a while. */
export async function measureStreams(app: string, cookie: string, pid: number): Promise<number> {
  const before = heldBy(pid);
  const streams: ClientRequest[] = [];
  for (let n = 0; n < streamCount; n += 1) streams.push(await openStream(`${app}/api/diary/live`, cookie));
  await new Promise((resolve) => setTimeout(resolve, 20_000));
  const grown = heldBy(pid) - before;
  for (const stream of streams) stream.destroy();
  return grown;
}
