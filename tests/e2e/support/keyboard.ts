import type { Locator, Page } from "@playwright/test";
import { expect } from "./journey";

const isFocused = (target: Locator) => target.evaluate((element) => element === document.activeElement);

/** Presses Tab until the focus is on it: whatever Tab cannot reach does not pass. */
export async function tabTo(page: Page, target: Locator): Promise<void> {
  await expect(target).toBeVisible();
  for (let presses = 0; presses < 120; presses += 1) {
    if (await isFocused(target)) return;
    await page.keyboard.press("Tab");
  }
  throw new Error(`Tab does not lead to ${target}.`);
}

/** Types into a field in place of what stands there. */
export async function retype(page: Page, field: Locator, text: string): Promise<void> {
  await tabTo(page, field);
  await page.keyboard.press("ControlOrMeta+A");
  await page.keyboard.type(text);
  await expect(field).toHaveValue(text);
}

/** Goes through a list with the arrows until its choice reads so. */
export async function pick(page: Page, list: Locator, label: string): Promise<void> {
  await tabTo(page, list);
  const chosen = () =>
    list.evaluate((element) => (element as HTMLSelectElement).selectedOptions[0]?.textContent ?? "");
  const count = await list.locator("option").count();
  await page.keyboard.press("Home");
  for (let presses = 0; presses < count; presses += 1) {
    if ((await chosen()) === label) return;
    await page.keyboard.press("ArrowDown");
  }
  throw new Error(`The arrows do not lead to "${label}".`);
}
