import type { Page } from "@playwright/test";
import { expect } from "./journey";
import { expectPdf, pressUntil, type Treated } from "./treatment";

/** Seven movements; three of them have a line for each side, which makes ten. */
const movements = [
  "Sit to stand",
  "Step up",
  "Bridge",
  "Side leg lift",
  "Heel raise",
  "Hip hinge",
  "Backward leg reach",
];

export async function startProgramme(page: Page, { id }: Treated): Promise<void> {
  await page.goto(`/patients/${id}/programme`);
  await pressUntil(
    () => page.getByRole("button", { name: "Start a programme for left knee" }).click({ timeout: 5_000 }),
    () => page.waitForURL(/\/exercises\/programmes\/[0-9a-f-]{36}$/, { timeout: 60_000 }),
  );
}

async function add(page: Page, movement: string): Promise<void> {
  const dialog = page.getByRole("dialog", { name: "Add an exercise" });
  await pressUntil(
    () => page.getByRole("button", { name: /^Add an exercise/ }).click({ timeout: 5_000 }),
    () => expect(dialog).toBeVisible({ timeout: 10_000 }),
  );
  await dialog.getByLabel("Name, muscle or equipment").fill(movement.toLowerCase());
  await dialog.getByRole("listitem").first().getByText(movement, { exact: true }).click();
  await expect(dialog).toBeHidden();
}

/** Ten lines of 30 s work and 30 s rest in two rounds: twenty minutes, also after one has been made easier. */
export async function buildToTwentyMinutes(page: Page): Promise<void> {
  const equation = page.getByRole("region", { name: "Time of the session" });
  const total = equation.getByRole("status", { name: "Session time" });
  await expect(total).toHaveText("00:00");
  for (const movement of movements) await add(page, movement);
  await expect(equation).toContainText("10 items");
  await expect(equation.getByLabel("Rounds")).toHaveValue("2");
  await expect(equation.getByLabel("Seconds of work, every line")).toHaveValue("30");
  await expect(equation.getByLabel("Seconds of rest, every line")).toHaveValue("30");
  await expect(total).toHaveText("20:00");
  const lines = page.getByRole("main").locator("ol.items > li");
  await expect(lines).toHaveCount(10);

  const line = lines.filter({ hasText: "Step up" }).first();
  const form = line.getByRole("button", { name: /^Step up/ });
  const before = (await form.textContent()) ?? "";
  await line.getByRole("button", { name: "Easier form of Step up" }).click();
  await expect(form).not.toHaveText(before);
  await expect(total).toHaveText("20:00");
}

/** Gives the version out, and takes the paper that opens for it. */
export async function giveAndPrint(page: Page, { givenName, name }: Treated): Promise<void> {
  const dialog = page.getByRole("dialog", { name: `Give these exercises to ${givenName}` });
  await pressUntil(
    () => page.getByRole("button", { name: `Give to ${givenName}…` }).click({ timeout: 5_000 }),
    () => expect(dialog).toBeVisible({ timeout: 10_000 }),
  );
  const paper = page.context().waitForEvent("request", {
    predicate: (request) => request.url().includes("/handout?versionNumber="),
    timeout: 60_000,
  });
  await dialog.getByRole("button", { name: "Give and print" }).click();
  const address = (await paper).url();
  await expectPdf(page, address);
  await expect(page.getByRole("status").filter({ hasText: `given to ${name}` })).toBeVisible();
  await expect(page.getByRole("region", { name: "Versions" })).toContainText(/given out .* by Nia Prosser/);
  for (const other of page.context().pages()) if (other !== page) await other.close();
}
