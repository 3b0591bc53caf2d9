import type { Page } from "@playwright/test";
import { expectAccessible } from "./support/accessible";
import { expect, signIn, test } from "./support/journey";

const focusedName = (page: Page) =>
  page.evaluate(() => document.activeElement?.getAttribute("aria-label") ?? "");

/** The same weekday in two weeks: far enough to have room, near enough to be planned. */
function inTwoWeeks(): string {
  return new Date(Date.now() + 14 * 86_400_000).toISOString().slice(0, 10);
}

/** Moves the cursor down, column by column, until it stands on a free place of half an hour. */
async function findFreePlace(page: Page): Promise<string> {
  for (let column = 0; column < 4; column += 1) {
    for (let step = 0; step < 90; step += 1) {
      const name = await focusedName(page);
      if (/free for (30|35|4\d|5\d) min|free for \d h/.test(name)) return name;
      await page.keyboard.press("ArrowDown");
    }
    await page.keyboard.press("Home");
    await page.keyboard.press("ArrowRight");
  }
  throw new Error("No free half hour on this day.");
}

test("the day grid: book, open, move, cancel and undo without a mouse", async ({ page }) => {
  await signIn(page, "reception");
  await page.goto(`/diary?day=${inTwoWeeks()}`);
  const cursor = page.locator('[role="gridcell"][tabindex="0"]');
  await cursor.focus();
  const first = await focusedName(page);
  // The grid is painted by the server first; it answers to keys a moment later.
  await expect(async () => {
    await page.keyboard.press("ArrowDown");
    expect(await focusedName(page)).not.toBe(first);
  }).toPass();
  await page.keyboard.press("Home");
  const place = await findFreePlace(page);
  await page.keyboard.press("b");
  const booking = page.getByRole("dialog", { name: "Book an appointment" });
  await expect(booking.getByLabel("Patient")).toBeFocused();
  await expect(booking.getByLabel("At", { exact: true })).toHaveValue(place.slice(0, 5));
  await expectAccessible(page);

  await page.keyboard.type("tam");
  await expect(page.getByRole("option").first()).toBeVisible();
  await page.keyboard.press("Enter");
  const patient = await booking.getByLabel("Patient").inputValue();
  await booking.getByLabel("For").selectOption({ label: "Follow-up, 30 min" });
  await booking.getByRole("button", { name: /^Book / }).press("Enter");
  await expect(booking).toBeHidden();
  const sheet = page.getByRole("complementary", { name: "The appointment" });
  await expect(sheet.getByRole("heading", { level: 2 })).toContainText(patient);
  await expectAccessible(page);

  await page.keyboard.press("m");
  const moving = page.getByRole("dialog", { name: `Move ${patient}` });
  await moving.getByLabel("At", { exact: true }).fill("not a time");
  await page.keyboard.press("Enter");
  await expect(moving.getByRole("alert")).toContainText("Enter a time, such as 10:15");
  await expect(moving.getByLabel("At", { exact: true })).toHaveValue("not a time");
  await page.keyboard.press("Escape");
  await expect(moving).toBeHidden();

  await page.keyboard.press("x");
  const cancelling = page.getByRole("dialog", { name: `Cancel ${patient}` });
  await cancelling.getByLabel("Why").fill("has a cold");
  await page.keyboard.press("Enter");
  await expect(cancelling).toBeHidden();
  await expect(sheet).toContainText("has a cold");

  await sheet.getByRole("button", { name: /^Undo, back to/ }).press("Enter");
  await expect(sheet.locator(".statenow")).toContainText("Booked");
  await page.keyboard.press("Escape");
  await expect(sheet).toBeHidden();
  await expect(cursor).toBeFocused();
});

test("today, week and find a time stand in light and dark, at the desk and on a phone", async ({ page }) => {
  await signIn(page, "reception");
  for (const address of ["/today", "/diary", "/diary/find"]) {
    await page.goto(address);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    await expectAccessible(page);
  }
  await page.goto("/diary/week");
  await expect(page.locator(".rbc-event").first()).toBeVisible();
  await expectAccessible(page);
  await page.setViewportSize({ width: 390, height: 844 });
  for (const address of ["/today", "/diary", "/diary/week", "/diary/find"]) {
    await page.goto(address);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    await expectAccessible(page);
    const isWider = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);
    expect(isWider, `${address} scrolls sideways at 390 px`).toBe(false);
  }
});
