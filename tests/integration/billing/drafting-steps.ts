import { invoiceLines, invoices, jobs } from "@withy/db/schema";
import type { SystemContext } from "@withy/services/context";
import { jobHandlers } from "@withy/services/job-handlers";
import { runNextJob } from "@withy/services/messaging";
import { and, eq, isNotNull } from "drizzle-orm";
import { systemContextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";
import { attend } from "./invoice-steps";

let placed = 0;

/** The first forty half-hours on one day, the next forty on the next: no room is taken twice. */
function nextDay(): string {
  placed += 1;
  return `2026-11-${String(1 + (Math.floor(placed / 40) % 28)).padStart(2, "0")}`;
}

/** Patients with one attended visit each at Saltgate, or as many as told. */
export async function attendedBy(
  practice: TestPractice,
  patients: number,
  visitsEach = 1,
): Promise<string[]> {
  const ids: string[] = [];
  for (let i = 0; i < patients; i += 1) {
    const { id } = await addPatient(practice);
    ids.push(id);
    for (let n = 0; n < visitsEach; n += 1) await attend(practice, id, nextDay());
  }
  return ids;
}

/** One round of a worker; the suite's own clock says what is due. */
export const workOnce = (practice: TestPractice, workerId = "w1", ctx = systemContextFor(practice)) =>
  runNextJob(ctx, { workerId, handlers: jobHandlers });

/** The database dies for this worker, for good, once it has begun so many transactions. */
export function killedAfter(practice: TestPractice, transactions: number): SystemContext {
  let begun = 0;
  const db = new Proxy(practice.db, {
    get(target, name, receiver) {
      if (name !== "transaction") return Reflect.get(target, name, receiver);
      begun += 1;
      return begun > transactions ? () => new Promise(() => {}) : target.transaction.bind(target);
    },
  });
  return { ...systemContextFor(practice), db };
}

export async function jobRow(practice: TestPractice, id: string) {
  const [row] = await practice.db.select().from(jobs).where(eq(jobs.id, id));
  return row;
}

/** Every visit that stands on a line of this practice, and every draft. */
export async function standingOf(practice: TestPractice) {
  const { db, practiceId } = practice;
  const lines = await db
    .select()
    .from(invoiceLines)
    .where(and(eq(invoiceLines.practiceId, practiceId), isNotNull(invoiceLines.appointmentId)));
  const drafts = await db.select().from(invoices).where(eq(invoices.practiceId, practiceId));
  return { lines, drafts };
}

/** The first time that lines are about to be written, `meanwhile` is done by somebody else and committed. */
export function interruptedBy(practice: TestPractice, meanwhile: () => Promise<unknown>): TestPractice["db"] {
  let isDone = false;
  const within = (tx: TestPractice["db"]) =>
    new Proxy(tx, {
      get(target, name, receiver) {
        if (name !== "insert" || isDone) return Reflect.get(target, name, receiver);
        return (table: typeof invoiceLines) => {
          if (table !== invoiceLines) return target.insert(table);
          isDone = true;
          return {
            values: async (rows: (typeof invoiceLines.$inferInsert)[]) => {
              await meanwhile();
              return target.insert(table).values(rows);
            },
          };
        };
      },
    });
  return new Proxy(practice.db, {
    get(target, name, receiver) {
      if (name !== "transaction") return Reflect.get(target, name, receiver);
      return (
        work: (tx: TestPractice["db"]) => Promise<unknown>,
        config: Parameters<typeof target.transaction>[1],
      ) => target.transaction((tx) => work(within(tx as unknown as TestPractice["db"])), config);
    },
  });
}
