import type { Page } from "@playwright/test";
import type { TodayView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { type NewPerson, read, zone } from "./desk";
import { chooseOption, linesOf, sheetOf } from "./desk-visit";
import { expect } from "./journey";

export async function seeToday(page: Page): Promise<void> {
  await expect(async () => {
    await page.goto("/today");
    const view = await read<TodayView>(page, "/api/diary/today");
    expect(view.sites.map((site) => site.name)).toEqual(["Saltgate"]);
    await expect(page.getByRole("heading", { level: 1 })).toHaveText(`Today, ${titleDate(view.day)}`, {
      timeout: 5_000,
    });
    const arrivals = page.getByRole("region", { name: "Arrivals" });
    await expect(arrivals.getByRole("link")).toHaveText(view.arrivals.map((one) => one.patientName));
    if (view.arrivals.length === 0) await expect(arrivals).toContainText("No one else is expected today.");
    const gaps = page.getByRole("region", { name: "Gaps to fill" });
    await expect(gaps.getByRole("listitem")).toHaveCount(view.gaps.length);
    const owed = page.getByRole("region", { name: "To collect" });
    await expect(owed.getByRole("listitem")).toHaveCount(view.toCollect?.length ?? -1);
  }, "the page and the API tell the same unless something changed between them").toPass();
}

export async function markArrived(page: Page, person: NewPerson): Promise<void> {
  await page.goto("/today");
  const arrive = page.getByRole("button", { name: /^Arrived: / });
  // Late in the day or at the weekend no one is left to come: someone walks in.
  if ((await arrive.count()) === 0) await bookForNow(page, person);
  const label = (await arrive.first().getAttribute("aria-label")) ?? "";
  const name = label.replace("Arrived: ", "");
  const next = page.getByRole("button", { name: `In session: ${name}`, exact: true });
  await expect(async () => {
    if ((await next.count()) === 0)
      await page.getByRole("button", { name: label, exact: true }).first().click();
    await expect(next).toBeVisible({ timeout: 5_000 });
  }, "a press is heard as soon as the page has woken").toPass();
}

async function bookForNow(page: Page, person: NewPerson): Promise<void> {
  const now = new Date();
  const before = new Date(Math.floor((now.getTime() - 30 * 60_000) / 300_000) * 300_000);
  const start = dayOf(before, zone) === dayOf(now, zone) ? timeOf(before, zone) : "00:00";
  await page.goto("/diary/find");
  await chooseOption(page, page.getByLabel("Patient", { exact: true }), person.name);
  await page.getByLabel("For", { exact: true }).selectOption({ label: "Strength test, 25 minutes" });
  await linesOf(page)
    .first()
    .getByRole("button", { name: /^Book / })
    .click();
  const dialog = page.getByRole("dialog", { name: "Book an appointment" });
  await dialog.getByLabel("Day", { exact: true }).fill("today");
  await dialog.getByLabel("At", { exact: true }).fill(start);
  await dialog.getByLabel("Site", { exact: true }).selectOption({ label: "Saltgate" });
  await dialog.getByLabel("With", { exact: true }).selectOption({ label: "Ingrid Solheim" });
  await dialog.getByLabel("Room", { exact: true }).selectOption({ label: "Any free room" });
  await dialog.getByRole("button", { name: /^Book / }).click();
  await dialog.getByLabel("Why book it all the same").fill("Walked in");
  await dialog.getByRole("button", { name: /^Book / }).click();
  await expect(sheetOf(page)).toContainText("Outside the usual hours: Walked in");
  await page.goto("/today");
  await expect(page.getByRole("button", { name: `Arrived: ${person.name}` })).toBeVisible();
}
