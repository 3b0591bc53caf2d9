import { expect, test } from "vitest";
import { readPlaywrightReport, readVitestReport } from "../../scripts/checks.mjs";
import { checkNode } from "../../scripts/machine.mjs";
import { parseEnvFile, readSettings } from "../../scripts/settings.mjs";

const noFile = "/dev/null";

test(".env lines: comments, quotes and export are understood", () => {
  const text =
    '# ports\nWITHY_PORT=3010\n\nexport WITHY_DEMO="0"\nWITHY_MAIL_FROM=Withy <a=b@withy.example>\n';
  expect(parseEnvFile(text)).toEqual({
    WITHY_PORT: "3010",
    WITHY_DEMO: "0",
    WITHY_MAIL_FROM: "Withy <a=b@withy.example>",
  });
});

test("a broken .env line is named by its number", () => {
  expect(() => parseEnvFile("WITHY_PORT=1\nwhat is this")).toThrow("Line 2 of .env");
});

test("defaults give a demonstration on this machine", () => {
  const settings = readSettings({}, noFile);
  expect(settings).toMatchObject({
    port: 3000,
    dbPort: 33306,
    fakesPort: 3100,
    smtpPort: 3125,
    demo: true,
    url: "http://localhost:3000",
  });
  expect(settings.dataDir).toMatch(/\.withy$/);
});

test.each([
  [{ WITHY_PORT: "http" }, 'WITHY_PORT is "http"'],
  [{ WITHY_DB_PORT: "70000" }, 'WITHY_DB_PORT is "70000"'],
  [{ WITHY_PORT: "3100" }, "WITHY_PORT and WITHY_FAKES_PORT are both 3100"],
  [{ WITHY_DEMO: "yes" }, 'WITHY_DEMO is "yes"'],
  [{ WITHY_URL: "withy.example" }, 'WITHY_URL is "withy.example"'],
])("%o is refused in words", (env, words) => {
  expect(() => readSettings(env, noFile)).toThrow(words);
});

test("real use names every service that the demonstration stands in for", () => {
  expect(() => readSettings({ WITHY_DEMO: "0" }, noFile)).toThrow(
    "WITHY_URL, WITHY_SMTP_HOST, WITHY_SMTP_PORT, WITHY_MAIL_FROM, WITHY_CARD_KEY, WITHY_CARD_WEBHOOK_SECRET",
  );
  const real = {
    WITHY_DEMO: "0",
    WITHY_URL: "https://withy.example/",
    WITHY_SMTP_HOST: "mail.example",
    WITHY_SMTP_PORT: "587",
    WITHY_MAIL_FROM: "post@withy.example",
    WITHY_CARD_KEY: "sk_live_x",
    WITHY_CARD_WEBHOOK_SECRET: "whsec_x",
  };
  expect(readSettings(real, noFile)).toMatchObject({
    demo: false,
    url: "https://withy.example",
    smtpPort: 587,
  });
});

test.each([
  ["20.19.0", true],
  ["20.18.9", false],
  ["18.20.0", false],
  ["22.0.0", true],
])("Node %s is accepted: %s", (version, isAccepted) => {
  const check = () => checkNode(version);
  if (isAccepted) expect(check).not.toThrow();
  else expect(check).toThrow("needs Node 20.19");
});

test("a test file that cannot be loaded counts as a failure", () => {
  const report = {
    testResults: [
      { status: "passed", assertionResults: [{ status: "passed" }, { status: "passed" }] },
      { status: "failed", assertionResults: [] },
      { status: "failed", assertionResults: [{ status: "failed" }, { status: "pending" }] },
    ],
  };
  expect(readVitestReport(report)).toEqual({ passed: 2, failed: 2, skipped: 1 });
});

test("a journey that passed only at the second try counts as a failure", () => {
  const report = { stats: { expected: 3, unexpected: 1, flaky: 1, skipped: 0 }, errors: [] };
  expect(readPlaywrightReport(report)).toEqual({ passed: 3, failed: 2, skipped: 0 });
});
