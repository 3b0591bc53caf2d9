import { expect, test } from "vitest";
import { readSources } from "./support/source-files";

/** Forms that need not wait, and why. */
const mayBeSentByTheBrowser = new Set([
  // A filter with a name of its own: sent by the browser, it filters all the same.
  "apps/staff/src/features/billing/components/accounts-filters.tsx",
  // Several fields and no submit button: browsers do not send such a form.
  "apps/staff/src/features/diary/components/wishes-form.tsx",
]);

test("no form is sent by the browser before scripts run, unless a server answers it", () => {
  const forms = readSources(["apps/staff/src"], [".tsx"]).filter(({ text }) => /<form\b/.test(text));
  expect(forms.length).toBeGreaterThan(10);
  const waits = (text: string) => /disabled=\{!isAwake\}/.test(text);
  const isAnswered = (text: string) => /<form\b[^>]*\baction=/.test(text);
  // A dialog opens by script alone.
  const isInDialog = (text: string) => /<Dialog\b/.test(text);
  const wrong = forms.filter(
    ({ path, text }) =>
      !waits(text) && !isAnswered(text) && !isInDialog(text) && !mayBeSentByTheBrowser.has(path),
  );
  expect(wrong.map(({ path }) => path)).toEqual([]);
});
