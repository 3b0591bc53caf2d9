import { workerHeartbeats } from "@withy/db/schema";
import { max } from "drizzle-orm";
import type { SystemContext } from "../context";

export interface Health {
  readonly isWell: boolean;
  readonly app: "ok";
  readonly database: "ok" | "not ok";
  readonly worker: "ok" | "not ok";
}

/** A worker beats every few seconds; one that is silent this long is counted as gone. */
const silentSeconds = 30;

export async function checkHealth(ctx: SystemContext): Promise<Health> {
  try {
    const [row] = await ctx.db.select({ beatAt: max(workerHeartbeats.beatAt) }).from(workerHeartbeats);
    const age = row?.beatAt ? ctx.clock.now().getTime() - row.beatAt.getTime() : Number.POSITIVE_INFINITY;
    const worker = age <= silentSeconds * 1000 ? "ok" : "not ok";
    return { isWell: worker === "ok", app: "ok", database: "ok", worker };
  } catch {
    return { isWell: false, app: "ok", database: "not ok", worker: "not ok" };
  }
}
