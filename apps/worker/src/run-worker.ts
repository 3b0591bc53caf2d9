import type { SystemContext } from "@withy/services/context";
import { sendDueReminders, settleOffers } from "@withy/services/diary";
import {
  beatHeart,
  type DrainOptions,
  drainOutbox,
  type JobHandler,
  pruneOldClaims,
  runNextJob,
  stopHeart,
} from "@withy/services/messaging";

export interface WorkerOptions extends DrainOptions {
  /** A context of its own for each round, so that a log line names the round. */
  readonly newContext: () => SystemContext;
  readonly jobHandlers: Readonly<Record<string, JobHandler>>;
  /** Told of a job that failed, without personal data. */
  readonly onJobFault: (fault: { jobId: string; kind: string; error: unknown }) => void;
  readonly onTrouble: (what: string, error: unknown) => void;
  readonly idleMs?: number;
  readonly beatMs?: number;
  readonly pruneMs?: number;
  readonly remindMs?: number;
  readonly offersMs?: number;
}

export interface Worker {
  /** Ends after the message in hand and the part of a job in hand; the rest of that job waits for the next worker. */
  stop(): Promise<void>;
}

/** Wakes early where the signal is raised. */
function sleep(ms: number, signal: AbortSignal): Promise<void> {
  if (signal.aborted) return Promise.resolve();
  return new Promise((resolve) => {
    const timer = setTimeout(done, ms);
    function done() {
      clearTimeout(timer);
      signal.removeEventListener("abort", done);
      resolve();
    }
    signal.addEventListener("abort", done);
  });
}

/** Does the work again and again until stopped; a failure (the database is away) is told and tried again later. */
async function repeat(
  signal: AbortSignal,
  options: WorkerOptions,
  what: string,
  work: () => Promise<number>,
): Promise<void> {
  while (!signal.aborted) {
    let pause: number;
    try {
      pause = await work();
    } catch (error) {
      options.onTrouble(what, error);
      pause = 5_000;
    }
    if (pause > 0) await sleep(pause, signal);
  }
}

/** Starts the heartbeat, the mail, the jobs, the ends of offers and the housekeeping side by side: none waits for another. */
export function runWorker(options: WorkerOptions): Worker {
  const {
    workerId,
    newContext,
    idleMs = 1_000,
    beatMs = 5_000,
    pruneMs = 3_600_000,
    remindMs = 60_000,
    offersMs = 5_000,
  } = options;
  const control = new AbortController();
  const startedAt = newContext().clock.now();
  const loops = [
    repeat(control.signal, options, "heartbeat", async () => {
      await beatHeart(newContext(), workerId, startedAt);
      return beatMs;
    }),
    repeat(control.signal, options, "outbox", async () =>
      (await drainOutbox(newContext(), options)) > 0 ? 0 : idleMs,
    ),
    repeat(control.signal, options, "jobs", async () => {
      const { jobHandlers: handlers, onJobFault: onFault } = options;
      const ran = await runNextJob(newContext(), { workerId, handlers, onFault, signal: control.signal });
      return ran ? 0 : idleMs;
    }),
    repeat(control.signal, options, "reminders", async () => {
      await sendDueReminders(newContext());
      return remindMs;
    }),
    repeat(control.signal, options, "offers", async () =>
      (await settleOffers(newContext())) > 0 ? 0 : offersMs,
    ),
    repeat(control.signal, options, "housekeeping", async () =>
      (await pruneOldClaims(newContext())) > 0 ? 100 : pruneMs,
    ),
  ];
  return {
    async stop() {
      control.abort();
      await Promise.all(loops);
      await stopHeart(newContext(), workerId);
    },
  };
}
