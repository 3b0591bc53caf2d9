import { defineConfig } from "@playwright/test";

/** The address comes from scripts/journeys.mjs, or by hand for a stack that already runs. */
export default defineConfig({
  testDir: ".",
  outputDir: "../../test-results/journeys",
  // One at a time: the journeys share the demonstration practice and two cores.
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 90_000,
  expect: { timeout: 10_000 },
  use: {
    baseURL: process.env.WITHY_E2E_URL ?? "http://localhost:3000",
    locale: "en-GB",
    timezoneId: "Europe/London",
    viewport: { width: 1440, height: 900 },
    trace: "retain-on-failure",
    screenshot: "only-on-failure",
    launchOptions: { executablePath: "/usr/bin/chromium", args: ["--no-sandbox", "--disable-dev-shm-usage"] },
  },
});
