import { staffAccounts } from "@withy/db/schema";
import { demoPasswordHash } from "@withy/db/seed/demo-password";
import { eq } from "drizzle-orm";
import type { SystemContext } from "../context";

/** Whether anyone can still sign in with the demonstration's published password. Real use must not start then. */
export async function hasDemoAccounts(ctx: SystemContext): Promise<boolean> {
  const [row] = await ctx.db
    .select({ id: staffAccounts.id })
    .from(staffAccounts)
    .where(eq(staffAccounts.passwordHash, demoPasswordHash))
    .limit(1);
  return row !== undefined;
}
