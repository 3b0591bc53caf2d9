import type { Page } from "@playwright/test";
import { shortDate } from "@withy/core/date-words";
import { addDays, weekdayOf } from "@withy/core/plain-date";
import { dayOf } from "@withy/core/wall-clock";
import { expectAccessible } from "./support/accessible";
import { expect, signIn, test } from "./support/journey";

/** Today is over by the evening; the next weekday has its visits whenever this runs. */
function nextWeekday(): string {
  let day = addDays(dayOf(new Date(), "Europe/London"), 1);
  while (weekdayOf(day) > 5) day = addDays(day, 1);
  return day;
}

/** Plans for one therapist after another until somebody is booked with one: not everyone works every day. */
async function planForSomeone(page: Page, day: string): Promise<string> {
  const therapist = page.getByLabel("Therapist", { exact: true });
  const names = (await therapist.locator("option").allTextContents()).slice(1);
  for (const name of names) {
    await therapist.selectOption({ label: name });
    await page.getByLabel("From", { exact: true }).fill(shortDate(day));
    await page.getByLabel("Until", { exact: true }).fill(shortDate(day));
    await page.getByLabel("Why").fill("Unwell");
    await page.getByRole("button", { name: "Look for other places" }).click();
    const title = page.getByRole("heading", { level: 1, name: `Cover for ${name}` });
    const refusal = page.getByRole("alert").filter({ hasText: "Nobody is booked there" });
    await expect(title.or(refusal)).toBeVisible({ timeout: 20_000 });
    if (await title.isVisible()) return name;
    await expect(page.getByLabel("Why")).toHaveValue("Unwell");
  }
  throw new Error("Nobody is booked on that day.");
}

test("a therapist is away: planned, one changed, applied, seen in the diary, undone", async ({ page }) => {
  const day = nextWeekday();
  await signIn(page, "owner");
  await page.goto("/diary");
  await page.getByRole("link", { name: "Arrange cover" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Arrange cover" })).toBeVisible();
  await expectAccessible(page);
  const who = await planForSomeone(page, day);

  const apply = page.getByRole("button", { name: /^Move \d+ visits?/ });
  await expect(apply).toBeVisible({ timeout: 60_000 });
  const rows = page.getByRole("table", { name: "Visits of the plan" }).locator("tbody tr");
  await expect(rows.first()).toBeVisible();
  await expectAccessible(page);

  const row = rows.filter({ has: page.getByRole("button", { name: /^Phone .* first$/ }) }).first();
  const patient = (await row.getByRole("link").textContent()) ?? "";
  await row
    .getByRole("button", { name: "Change" })
    .or(row.getByRole("button", { name: /^Another place/ }))
    .click();
  const dialog = page.getByRole("dialog", { name: `Another place for ${patient}` });
  const other = dialog.getByRole("button", { name: /^Take / }).nth(1);
  const place = ((await other.getAttribute("aria-label")) ?? "").replace("Take ", "");
  await expectAccessible(page);
  await other.click();
  await expect(dialog).toBeHidden();
  const changed = rows.filter({ has: page.getByRole("link", { name: patient, exact: true }) }).first();
  await expect(changed).toContainText(place);
  await changed.getByRole("button", { name: `Phone ${patient} first` }).click();
  await expect(changed).toContainText("to ring");

  await apply.click();
  const undo = page.getByRole("button", { name: "Undo it all" });
  await expect(undo).toBeVisible();
  await expect(page.getByText(/^\d+ minutes left$/)).toBeVisible();
  await expect(page.getByRole("region", { name: "To ring" })).toContainText(patient);
  await expectAccessible(page);
  const plan = page.url();

  await page.goto(`/diary?day=${day}`);
  await expect(page.getByRole("main")).toContainText("Unwell");

  await page.goto(plan);
  await undo.click();
  await expect(page.getByRole("main")).toContainText("undone");
  await page.goto(`/diary?day=${day}`);
  await expect(page.getByRole("main")).not.toContainText("Unwell");
  await expect(page.getByRole("main")).toContainText(who.split(" ")[0] ?? who);
});
