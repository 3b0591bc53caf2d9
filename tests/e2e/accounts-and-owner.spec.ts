import type { InvoiceListView } from "@withy/contracts/billing";
import type { PatientPage } from "@withy/contracts/patients";
import { expectAccessible } from "./support/accessible";
import { attendedVisit, draftFor } from "./support/attended-visit";
import { newName, read } from "./support/desk";
import {
  addRoller,
  draftVisits,
  expectPdf,
  highestNumber,
  payByCard,
  payment,
  readInvoice,
  refundPart,
  sumOf,
  takeCash,
} from "./support/invoice-page";
import { demoPassword, expect, signIn, test } from "./support/journey";
import { retype, tabTo } from "./support/keyboard";
import { openBilled, openBooked, seeMonth } from "./support/month-page";
import {
  enter,
  expectDeskOnly,
  expectSignedOut,
  firstPassword,
  invite,
  join,
  resetPassword,
  secondPassword,
  staffRow,
} from "./support/staff-account";

test("an attended visit becomes an invoice: drafted, issued, paid in cash and by card, part refunded", async ({
  page,
}) => {
  test.slow();
  await signIn(page, "reception");
  const patient = await attendedVisit(page);
  await page.context().clearCookies();
  await signIn(page, "accounts");
  await test.step("drafts what waits and opens the draft", () => draftVisits(page, patient));
  await test.step("adds goods and sees the VAT of each line", () => addRoller(page));
  const before = await highestNumber(page);
  await page.getByRole("button", { name: "Issue £100.79" }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Invoice");
  const reference = `${before.prefix}-${String(before.counter + 1).padStart(5, "0")}`;
  await expect(page.getByRole("article", { name: reference })).toBeVisible();
  expect(await highestNumber(page)).toEqual({ ...before, counter: before.counter + 1 });
  await test.step("takes a part in cash", () => takeCash(page));
  await test.step("takes the rest by card", () => payByCard(page));
  await test.step("gives a part back", () => refundPart(page));
  const invoice = await readInvoice(page);
  expect([invoice.paidPence, invoice.creditedPence, invoice.owedPence]).toEqual([8_079, 2_000, 0]);
  await test.step("has it as PDF", () => expectPdf(page));
  await page.goto(`/billing?${new URLSearchParams({ kind: "paid", find: reference })}`);
  await expect(page.getByRole("row").filter({ hasText: reference })).toContainText(patient.name);
});

test("by keyboard alone: a draft is issued and paid in cash", async ({ page }) => {
  test.slow();
  const { keyboard } = page;
  await signIn(page, "reception");
  const patient = await attendedVisit(page);
  const draft = await draftFor(page, patient);
  await page.context().clearCookies();
  await page.goto("/sign-in");
  await retype(page, page.getByLabel("E-mail address"), "accounts@marram.example");
  await retype(page, page.getByLabel("Password"), demoPassword);
  await keyboard.press("Enter");
  await page.waitForURL("**/billing");
  await tabTo(page, page.getByRole("link", { name: /^To issue/ }));
  await keyboard.press("Enter");
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("To issue");
  // The draft stands at the end of a list that may be hundreds long: its address leads there.
  await page.goto(draft);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Draft");
  await keyboard.press("i");
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Invoice");
  await expect(sumOf(page, /^To pay/)).toHaveText("£78.00");
  await keyboard.press("p");
  await expect(page.getByRole("radio", { name: /Card reader/ })).toBeFocused();
  await keyboard.press("3");
  await expect(page.getByRole("radio", { name: /Cash/ })).toBeChecked();
  await keyboard.press("Enter");
  await expect(payment(page)).toContainText("Paid");
  await expect(sumOf(page, /cash, thank you/)).toHaveText("−£78.00");
});

test("the owner reads last month and opens a figure to its rows", async ({ page }) => {
  test.slow();
  await signIn(page, "owner");
  const view = await test.step("sees the figures", () => seeMonth(page));
  await test.step("opens how full a therapist was", () => openBooked(page, view));
  await test.step("opens what was billed, down to an invoice", () => openBilled(page, view));
});

test("a colleague is invited, joins, resets a password, signs out everywhere, and leaves", async ({
  page,
  browser,
}) => {
  test.slow();
  await signIn(page, "owner");
  const colleague = newName();
  const { name, email } = colleague;
  await test.step("the owner invites", () => invite(page, colleague));
  const rooms = await Promise.all([browser.newContext(), browser.newContext()]);
  const [desk, home] = await Promise.all([rooms[0].newPage(), rooms[1].newPage()]);
  await test.step("the link of the mail sets a password", () => join(desk, colleague, firstPassword));
  await enter(desk, email, firstPassword);
  await test.step("only what the role allows is there", () => expectDeskOnly(desk));
  await test.step("a new password by mail", () => resetPassword(home, email, secondPassword));
  await test.step("the session from before has ended", () => expectSignedOut(desk));
  await enter(desk, email, firstPassword);
  await expect(desk.getByRole("alert").filter({ hasText: "do not match" })).toBeVisible();
  for (const browserPage of [desk, home]) {
    await enter(browserPage, email, secondPassword);
    await browserPage.waitForURL("**/today");
  }
  await home.goto("/account");
  await expect(home.getByRole("table", { name: "Your sessions" }).getByRole("rowheader")).toHaveCount(2);
  await home.getByRole("button", { name: "Sign out everywhere" }).click();
  await home.waitForURL(/\/sign-in/);
  await test.step("both browsers are signed out", async () => {
    await expectSignedOut(home);
    await expectSignedOut(desk);
  });
  await enter(desk, email, secondPassword);
  await desk.waitForURL("**/today");
  await page.getByRole("button", { name: `End access of ${name}` }).click();
  await page
    .getByRole("dialog", { name: `End the access of ${name}` })
    .getByRole("button", { name: "End access" })
    .click();
  await expect(staffRow(page, colleague)).toContainText("has left");
  await test.step("who has left is signed out at once", () => expectSignedOut(desk));
  await Promise.all(rooms.map((room) => room.close()));
});

test("the owner's pages behind the sections pass axe", async ({ page }) => {
  test.slow();
  await signIn(page, "owner");
  // The sections of the head are walked in doors.spec.ts.
  const pages = ["/billing/drafts", "/settings", "/settings/audit", "/account"];
  for (const address of [...pages, "/messages"]) {
    const answer = await page.goto(address);
    expect(answer?.status(), address).toBe(200);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    await expectAccessible(page);
  }
  await page.context().clearCookies();
  await page.goto("/forgot");
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Choose a new password");
  await expectAccessible(page);
});

test("an invoice passes axe with its dialogs open", async ({ page }) => {
  test.slow();
  await signIn(page, "accounts");
  const paid = await read<InvoiceListView>(page, "/api/billing/invoices?kind=paid");
  await page.goto(`/billing/invoices/${paid.rows[0]?.id}`);
  await expectAccessible(page);
  await page
    .getByRole("button", { name: /^Give back…/ })
    .first()
    .click();
  await expect(page.getByRole("dialog", { name: /^Give money back on / })).toBeVisible();
  await expectAccessible(page);
  const owed = await read<InvoiceListView>(page, "/api/billing/invoices?kind=owed&pageSize=100");
  const unpaid = owed.rows.find(({ state }) => state === "issued");
  await page.goto(`/billing/invoices/${unpaid?.id}`);
  await page.getByRole("button", { name: "Make void…" }).click();
  await expect(page.getByRole("dialog", { name: `Make ${unpaid?.reference} void` })).toBeVisible();
  await expectAccessible(page);
});

test("another practice's owner finds neither the invoice nor the patient", async ({ page }) => {
  test.slow();
  await signIn(page, "owner");
  const { rows } = await read<InvoiceListView>(page, "/api/billing/invoices?kind=all");
  const patients = await read<PatientPage>(page, "/api/patients?pageSize=1");
  const addresses = [`billing/invoices/${rows[0]?.id}`, `patients/${patients.rows[0]?.id}`];
  for (const address of addresses) expect((await page.goto(`/${address}`))?.status(), address).toBe(200);
  await page.context().clearCookies();
  await signIn(page, "otherOwner");
  for (const address of addresses) {
    const answer = await page.goto(`/${address}`);
    expect(answer?.status(), address).toBe(404);
    await expect(page.getByRole("heading", { level: 1 })).toHaveText("This page is not in the book");
    expect((await page.request.get(`/api/${address}`)).status(), address).toBe(404);
  }
  expect((await page.request.get(`/api/${addresses[0]}/pdf`)).status()).toBe(404);
});
