import "server-only";
import { hasDemoAccounts } from "@withy/services/practices";
import { env } from "./env";
import { systemContext } from "./session";

/**
 * Ends the process where the settings are not complete, or where real use would run on a database that still opens
 * with the demonstration's published password.
 */
export async function refuseUnsafeStart(): Promise<void> {
  try {
    if (env().WITHY_DEMO === "1") return;
    if (!(await hasDemoAccounts(systemContext()))) return;
    console.error(
      "This database holds the demonstration practice, whose password is published. Start real use on a data folder of its own (WITHY_DATA_DIR).",
    );
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
  }
  process.exit(1);
}
