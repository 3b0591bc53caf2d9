import { AppError } from "@withy/core/errors";
import { requestLimits } from "@withy/db/schema";
import { eq, sql } from "drizzle-orm";
import type { SystemContext } from "./context";

/** So many tries in so many minutes; after the last one its key waits as long. */
export interface TryLimit {
  /** Sets its keys apart from those of other limits. */
  readonly name: string;
  readonly tries: number;
  readonly minutes: number;
  /** What to do once the wait is over, as the end of a sentence: "try again". */
  readonly advice: string;
}

const rowOf = (limit: TryLimit, key: string) => `${limit.name}:${key}`;

/**
 * Counts one try before anybody knows whether it is right, so that many at once are all counted. Call it outside a
 * transaction: the count must outlive the refusal. It lapses by itself, so nobody is locked out for good.
 * @throws refused "too-many-tries" with the minutes to wait
 */
export async function spendTry(ctx: SystemContext, limit: TryLimit, key: string): Promise<void> {
  const now = ctx.clock.now().getTime();
  const until = now + limit.minutes * 60_000;
  // Assigned from left to right: in the second line `points` is already the new count.
  const [rows] = (await ctx.db.execute(sql`
    insert into request_limits (\`key\`, points, expire) values (${rowOf(limit, key)}, 1, ${until})
    on duplicate key update
      points = if(expire <= ${now}, 1, points + 1),
      expire = if(expire <= ${now} or points = ${limit.tries}, ${until}, expire)
    returning points, expire`)) as unknown as [{ points: number; expire: number }[]];
  const [counted] = rows;
  if (!counted || counted.points <= limit.tries) return;
  const wait = Math.ceil((Number(counted.expire) - now) / 60_000);
  throw new AppError(
    "refused",
    `Too many tries. Wait ${wait === 1 ? "a minute" : `${wait} minutes`}, then ${limit.advice}.`,
    { kind: "too-many-tries" },
  );
}

/** After a right answer: the tries before it no longer count. */
export async function forgetTries(ctx: SystemContext, limit: TryLimit, key: string): Promise<void> {
  await ctx.db.delete(requestLimits).where(eq(requestLimits.key, rowOf(limit, key)));
}
