import { defineConfig } from "vitest/config";

/** Two workers everywhere: the suites must finish on two cores, and each worker has a database of its own. */
const maxWorkers = 2;

export default defineConfig({
  test: {
    maxWorkers,
    projects: [
      {
        test: {
          name: "unit",
          environment: "node",
          include: [
            "packages/*/src/**/*.test.ts",
            "apps/{worker,fakes}/src/**/*.test.ts",
            "tests/published/**/*.test.ts",
            "tests/architecture/**/*.test.ts",
            "tests/scripts/**/*.test.ts",
          ],
          exclude: ["packages/ui/**", "**/node_modules/**", "tests/architecture/database/**"],
          testTimeout: 60_000,
        },
      },
      {
        resolve: { alias: { "@/": `${import.meta.dirname}/apps/staff/src/` } },
        test: {
          name: "ui-jsdom",
          environment: "jsdom",
          include: ["packages/ui/src/**/*.test.{ts,tsx}", "apps/staff/src/**/*.test.{ts,tsx}"],
          setupFiles: ["packages/ui/src/testing/patient-screens.ts"],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: "db",
          environment: "node",
          include: [
            "tests/integration/**/*.test.ts",
            "tests/architecture/database/**/*.test.ts",
            "tests/faults/**/*.test.ts",
          ],
          globalSetup: ["tests/support/database-server.ts"],
          setupFiles: ["tests/support/use-database.ts"],
          provide: { databaseCount: maxWorkers },
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
