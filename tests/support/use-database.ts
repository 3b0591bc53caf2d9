import { inject } from "vitest";
import { databaseUrl } from "../../scripts/settings.mjs";

// Runs before a test file is loaded, so that modules which read their address at load time find this worker's.
const database = `withy_test_${process.env.VITEST_POOL_ID ?? "1"}`;
const { appPassword, migratePassword } = inject("databasePasswords");
const port = inject("databasePort");
process.env.DATABASE_URL = databaseUrl("withy_app", appPassword, port, database);
process.env.WITHY_MIGRATE_URL = databaseUrl("withy_migrate", migratePassword, port, database);
