import type { Locator, Page } from "@playwright/test";
import { readInvoiceNumber } from "@withy/billing/invoice-number";
import type { InvoiceListView, InvoiceView } from "@withy/contracts/billing";
import type { Attender } from "./attended-visit";
import { read } from "./desk";
import { expect } from "./journey";

/** From the list of what waits to the draft of this patient's visit. */
export async function draftVisits(page: Page, patient: Attender): Promise<void> {
  await page.goto("/billing");
  await page.getByRole("link", { name: /^(To issue|Drafts)/ }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("To issue");
  const waiting = page.getByRole("region", { name: "Attended, on no draft yet" });
  await waiting.getByRole("button", { name: /^Draft \d+ visits?$/ }).click();
  const draft = page
    .getByRole("table", { name: "Drafts to issue" })
    .getByRole("row")
    .filter({ has: page.getByRole("rowheader", { name: patient.name }) });
  await expect(draft, "drafting all that wait takes its time").toContainText("1 visit", { timeout: 120_000 });
  await expect(draft).toContainText("78.00");
  await draft.getByRole("link", { name: patient.name }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Draft");
}

/** The cells of a line of the invoice: rate, net, VAT, total. */
async function expectLine(page: Page, about: RegExp, figures: readonly string[]): Promise<void> {
  const line = page.getByRole("table", { name: "What is charged" }).getByRole("row", { name: about });
  await expect(line.getByRole("cell")).toHaveText([/.*/, about, ...figures]);
}

/** Puts a roller on the draft, after a try without a choice; the VAT stands on each line. */
export async function addRoller(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Add it" }).click();
  await expect(page.getByText("Choose an item.", { exact: false }).last()).toBeVisible();
  await page.getByLabel("Item").selectOption({ label: "Foam roller, £18.99 plus 20%" });
  await page.getByRole("button", { name: "Add it" }).click();
  await expectLine(page, /Foam roller/, ["20%", "18.99", "3.80", "22.79"]);
  await expectLine(page, /Initial assessment, 45 minutes/, ["exempt", "78.00", "0.00", "78.00"]);
  const sums = page.getByRole("table", { name: "What is charged" }).getByRole("row", { name: /^Sum/ });
  await expect(sums.getByRole("cell")).toHaveText(["96.99", "3.80", "100.79"]);
  await expect(page.getByText("£18.99 at 20% is £3.80.")).toBeVisible();
}

/** The highest number that has been given so far, as a count. */
export async function highestNumber(page: Page): Promise<{ prefix: string; counter: number }> {
  const { rows } = await read<InvoiceListView>(page, "/api/billing/invoices?kind=all&pageSize=100");
  const numbers = rows.flatMap(({ reference }) => readInvoiceNumber(reference) ?? []);
  const highest = numbers.sort((a, b) => b.counter - a.counter)[0];
  if (!highest) throw new Error("No invoice has a number yet.");
  return highest;
}

export const idOf = (page: Page): string => new URL(page.url()).pathname.split("/").at(-1) ?? "";

export const readInvoice = (page: Page): Promise<InvoiceView> =>
  read<InvoiceView>(page, `/api/billing/invoices/${idOf(page)}`);

export async function expectPdf(page: Page): Promise<void> {
  const address = await page.getByRole("link", { name: "PDF", exact: true }).getAttribute("href");
  expect(address).toBe(`/api/billing/invoices/${idOf(page)}/pdf`);
  const answer = await page.request.get(address ?? "");
  expect(answer.status()).toBe(200);
  expect(answer.headers()["content-type"]).toMatch(/^application\/pdf/);
  expect((await answer.body()).subarray(0, 5).toString("latin1")).toBe("%PDF-");
}

/** A line of the sums below the charges, by its words. */
export const sumOf = (page: Page, words: RegExp): Locator =>
  page.getByRole("table", { name: "Sums" }).getByRole("row", { name: words }).getByRole("cell");

export const payment = (page: Page): Locator => page.getByRole("complementary", { name: "Payment" });

/** Too much is refused in words with what was typed; then a part is taken. */
export async function takeCash(page: Page): Promise<void> {
  const amount = page.getByLabel("Amount in pounds");
  await expect(amount).toHaveValue("100.79");
  await amount.fill("500");
  await page.getByRole("radio", { name: /Cash/ }).check();
  await page.getByRole("button", { name: "Take £500.00 by cash" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "Only £100.79 is owed." })).toBeVisible();
  await expect(amount).toHaveValue("500");
  await expect(page.getByRole("radio", { name: /Cash/ })).toBeChecked();
  await amount.fill("40.79");
  await page.getByRole("button", { name: "Take £40.79 by cash" }).click();
  await expect(sumOf(page, /cash, thank you/)).toHaveText("−£40.79");
  await expect(sumOf(page, /^To pay/)).toHaveText("£60.00");
  await expect(payment(page)).toContainText("Part paid");
}

/** The rest on the card company's page, declined once. Back again, its event has marked the invoice without being asked. */
export async function payByCard(page: Page): Promise<void> {
  const asked: string[] = [];
  page.on("request", (request) => {
    if (/\/card-payments\/[^/]+\/check$/.test(request.url())) asked.push(request.url());
  });
  const address = new URL(page.url()).pathname;
  await expect(page.getByLabel("Amount in pounds")).toHaveValue("60.00");
  await page.getByRole("radio", { name: /Card online/ }).check();
  await page.getByRole("button", { name: "Take £60.00 by card online" }).click();
  await page.waitForURL("**/card/pay/**");
  await page.getByRole("button", { name: "Decline" }).click();
  await expect(page.getByRole("alert")).toContainText("The card was declined.");
  await page.getByRole("button", { name: "Pay £60.00" }).click();
  await page.waitForURL((url) => url.pathname === address);
  await expect(payment(page)).toContainText("Paid");
  await expect(sumOf(page, /card online, thank you/)).toHaveText("−£60.00");
  await expect(sumOf(page, /^To pay/)).toHaveText("£0.00");
  await expect(page.getByLabel("Amount in pounds")).toBeHidden();
  expect(asked, "the event came before the payer did").toEqual([]);
}

/** Gives a part back to the card; without a reason it is refused and what was typed stays. */
export async function refundPart(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Give back… from £60.00 by card online" }).click();
  const dialog = page.getByRole("dialog", { name: /^Give money back on / });
  await dialog.getByLabel("Amount in pounds").fill("20");
  await dialog.getByRole("button", { name: "Give back £20.00" }).click();
  await expect(
    dialog.getByRole("alert").filter({ hasText: "Say why the money is given back." }),
  ).toBeVisible();
  await expect(dialog.getByLabel("Amount in pounds")).toHaveValue("20");
  await dialog.getByLabel("Why").fill("Visit cut short");
  await dialog.getByRole("button", { name: "Give back £20.00" }).click();
  await expect(dialog).toBeHidden();
  await expect(sumOf(page, /^Given back/)).toHaveText("£20.00");
  await expect(sumOf(page, /^No longer asked for/)).toHaveText("−£20.00");
  await expect(sumOf(page, /^To pay/)).toHaveText("£0.00");
  await expect(payment(page)).toContainText("£20.00 given back");
  await expect(page.getByText(/£20\.00 given back by card online: Visit cut short/)).toBeVisible();
}
