import type { Page } from "@playwright/test";
import { demoPassword, expect, test } from "./support/journey";
import { retype, tabTo } from "./support/keyboard";
import { arrivedToday, assessment, openedEpisode, registeredWithGp } from "./support/treatment";

/** The field under a heading, whose name also says that it is needed while it is empty. */
const fieldOf = (page: Page, heading: string) =>
  page.getByRole("textbox", { name: new RegExp(`^${heading}( needed)?$`) });

test("a note begun, written and signed by keyboard alone", async ({ page }) => {
  const { keyboard } = page;
  await page.goto("/sign-in");
  await retype(page, page.getByLabel("E-mail address"), "therapist@marram.example");
  await retype(page, page.getByLabel("Password"), demoPassword);
  await keyboard.press("Enter");
  await page.waitForURL("**/notes");
  const patient = await registeredWithGp(page);
  const visit = await arrivedToday(page, patient);
  await openedEpisode(page, visit);

  await page.goto(`/notes?visit=${visit.id}`);
  const begin = page.getByRole("button", { name: `Write the note of ${patient.name}` });
  await expect(begin, "the visit that was asked for is at hand").toBeFocused({ timeout: 60_000 });
  await keyboard.press("Enter");
  await page.waitForURL(/\/notes\/[0-9a-f-]{36}$/, { timeout: 60_000 });
  for (const [heading, , text] of assessment) {
    const field = fieldOf(page, heading);
    await tabTo(page, field);
    await keyboard.type(text);
    await expect(field).toHaveValue(text);
  }
  await keyboard.press("Control+Enter");
  const dialog = page.getByRole("dialog", { name: `Sign the note of ${patient.name}` });
  await tabTo(page, dialog.getByRole("button", { name: "Sign for good" }));
  await keyboard.press("Enter");
  await expect(page.getByText("Signed by Nia Prosser, PH100202")).toBeVisible({ timeout: 30_000 });
  await expect(page.getByRole("textbox")).toHaveCount(0);
  const written = page.getByRole("region", { name: "Initial assessment" });
  for (const [, , text] of assessment) await expect(written).toContainText(text);
});
