import { defineConfig } from "@playwright/test";

/** The address comes from scripts/journeys.mjs, or by hand for a stack that already runs. */
export default defineConfig({
  testDir: ".",
  outputDir: "../../test-results/journeys",
  // One at a time: the journeys share the demonstration practice and two cores.
  workers: 1,
  retries: 0,
  forbidOnly: true,
  // A busy machine is no failure; a journey that hangs still ends.
  timeout: 180_000,
  expect: { timeout: 30_000 },
  use: {
    actionTimeout: 60_000,
    navigationTimeout: 60_000,
    baseURL: process.env.WITHY_E2E_URL ?? "http://localhost:3000",
    locale: "en-GB",
    timezoneId: "Europe/London",
    viewport: { width: 1440, height: 900 },
    screenshot: "only-on-failure",
    launchOptions: {
      executablePath: "/usr/bin/chromium",
      // No graphics card to use, and nothing outside to look up.
      args: [
        "--no-sandbox",
        "--disable-dev-shm-usage",
        "--disable-gpu",
        "--disable-gpu-rasterization",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--no-first-run",
      ],
    },
  },
});
