import type { Page } from "@playwright/test";
import type { FigureRowsView, MonthView } from "@withy/contracts/reports";
import { plainDateWords } from "@withy/core/date-words";
import { formatMoney } from "@withy/core/money";
import { dayOf } from "@withy/core/zoned-time";
import { read, zone } from "./desk";
import { expect } from "./journey";

/** "2026-11" where today is in December 2026. */
export function monthBefore(now: Date): string {
  const [year = 0, month = 0] = dayOf(now, zone).split("-").map(Number);
  return month === 1 ? `${year - 1}-12` : `${year}-${String(month - 1).padStart(2, "0")}`;
}

const points = (share: number | null) => (share === null ? "no data" : String(Math.round(share / 100)));

/** The page shows what the API counts: how full by therapist and site, income by payer, debts by age. */
export async function seeMonth(page: Page): Promise<MonthView> {
  const month = monthBefore(new Date());
  const view = await read<MonthView>(page, `/api/reports/month?month=${month}`);
  await page.goto(`/reports/month?month=${month}`);
  await expect(page.getByRole("heading", { level: 1 })).toContainText(
    plainDateWords(view.firstOn).replace(/^\d+ /, ""),
  );
  expect(view.therapists.length).toBeGreaterThan(3);
  expect(view.bySite.map(({ name }) => name).sort()).toEqual(["Saltgate", "Tollhouse Lane", "Upper Wharf"]);
  const full = page.getByRole("table", { name: "Utilisation by therapist and by site" });
  for (const row of [...view.therapists, ...view.bySite]) {
    const line = full.getByRole("row").filter({ has: page.getByRole("rowheader", { name: row.name }) });
    await expect(line.getByRole("button")).toHaveText([
      points(row.booked),
      points(row.delivered),
      /^[\d.,]+$/,
    ]);
  }
  const income = page.getByRole("table", { name: "Billed by who pays" });
  for (const { netPence } of view.income) await expect(income).toContainText(formatMoney(netPence));
  expect(view.debts?.totalPence).toBeGreaterThan(0);
  await expect(page.getByRole("table", { name: "Owed by age" })).toContainText(
    formatMoney(view.debts?.totalPence ?? 0),
  );
  return view;
}

/** Opens how full one therapist was: the visits behind it add up to the minutes that the figure counts. */
export async function openBooked(page: Page, view: MonthView): Promise<void> {
  const therapist = view.therapists.find(({ bookedMinutes }) => bookedMinutes > 0);
  if (!therapist) throw new Error("No one was booked last month.");
  const query = new URLSearchParams({ month: view.month, figure: "booked", therapistId: therapist.id });
  const rows = await read<FigureRowsView>(page, `/api/reports/rows?${query}`);
  expect(rows.sumMinutes).toBe(therapist.bookedMinutes);
  await page
    .getByRole("table", { name: "Utilisation by therapist and by site" })
    .getByRole("row")
    .filter({ has: page.getByRole("rowheader", { name: therapist.name }) })
    .getByRole("button")
    .first()
    .click();
  const sheet = page.getByRole("dialog", { name: `Booked: ${therapist.name}` });
  await expect(sheet).toContainText(`${rows.total.toLocaleString("en-GB")} rows`);
  const listed = sheet.getByRole("table", { name: "Rows of Booked" }).getByRole("rowheader");
  await expect(listed).toHaveText(rows.rows.map(({ title }) => title));
  await page.keyboard.press("Escape");
  await expect(sheet).toBeHidden();
}

/** Opens what patients were billed and follows a row to its invoice. */
export async function openBilled(page: Page, view: MonthView): Promise<void> {
  const own = view.income.find(({ kind }) => kind === "patient");
  const words = "Patients paying themselves";
  await page
    .getByRole("table", { name: "Billed by who pays" })
    .getByRole("row", { name: words })
    .getByRole("button")
    .click();
  const sheet = page.getByRole("dialog", { name: `Billed: ${words}` });
  await expect(sheet).toContainText(`${formatMoney(own?.netPence ?? 0)} in all`);
  await sheet.getByRole("table").getByRole("link").first().click();
  await expect(page).toHaveURL(/\/billing\/invoices\//);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Invoice");
}
