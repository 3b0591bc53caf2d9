import type { Page } from "@playwright/test";
import { plainDateWords } from "@withy/core/date-words";
import type { NewPerson } from "./desk";
import { expect } from "./journey";

const surgery = "Quayside Surgery";

export async function meetFieldErrors(page: Page, person: NewPerson): Promise<void> {
  await page.goto("/patients/new");
  const submit = page.getByRole("button", { name: "Register patient" });
  const summary = page.getByRole("alert").filter({ hasText: "The patient is not saved yet" });
  // A press before the page has woken is the browser's own submit, and does nothing here.
  await expect(async () => {
    await submit.click();
    await expect(summary).toBeFocused({ timeout: 5_000 });
  }).toPass();
  await expect(summary.getByRole("link", { name: "Enter the given name." })).toBeVisible();
  await summary.getByRole("link", { name: "Enter the family name." }).click();
  await expect(page.getByLabel("Family name")).toBeFocused();
  await summary.getByRole("link", { name: /^Enter the date of birth/ }).click();
  await expect(page.getByLabel("Date of birth")).toBeFocused();
  await page.getByLabel("Given name").fill(person.givenName);
  await page.getByLabel("Date of birth").fill("31 2 1984");
  await page.getByLabel("E-mail address").fill("not an address");
  await submit.click();
  await expect(summary.getByRole("link", { name: /^Enter an e-mail address in full/ })).toBeVisible();
  await expect(summary.getByRole("link", { name: "Enter the given name." })).toHaveCount(0);
  await expect(page.getByLabel("Given name")).toHaveValue(person.givenName);
  await expect(page.getByLabel("Date of birth")).toHaveValue("31 2 1984");
  await expect(page.getByLabel("E-mail address")).toHaveValue("not an address");
}

async function fillPerson(page: Page, person: NewPerson): Promise<void> {
  await page.getByLabel("Given name").fill(person.givenName);
  await page.getByLabel("Family name").fill(person.familyName);
  await page.getByLabel("Date of birth").fill(person.bornText);
  await page.getByLabel("Phone", { exact: true }).fill(person.phone);
  await page.getByLabel("E-mail address").fill(person.email);
}

/** Answers with the payer's name. */
export async function register(page: Page, person: NewPerson): Promise<string> {
  await fillPerson(page, person);
  await page.getByLabel("GP surgery").fill("Quay");
  await page.getByRole("option", { name: new RegExp(surgery) }).click();
  const payers = page.getByLabel("Payer");
  await payers.selectOption({ index: 1 });
  await page.getByLabel("Policy number").fill("HC 22-1904");
  const payer = await payers.locator("option").nth(1).textContent();
  await page.getByRole("button", { name: "Register patient" }).click();
  await page.waitForURL(/\/patients\/[0-9a-f-]{36}$/);
  return payer ?? "";
}

export async function seeRecord(page: Page, person: NewPerson, payer: string): Promise<void> {
  await expect(page.getByRole("heading", { level: 1, name: person.name })).toBeVisible();
  const facts = page.getByRole("complementary", { name: "At a glance" });
  for (const words of [person.email, surgery, payer, "HC 22-1904"]) await expect(facts).toContainText(words);
}

export async function meetDuplicate(page: Page, person: NewPerson): Promise<void> {
  const record = page.url();
  await page.goto("/patients/new");
  const notice = page.getByRole("alert").filter({ hasText: "Someone like this is already registered." });
  await expect(async () => {
    await fillPerson(page, person);
    await page.getByRole("button", { name: "Register patient" }).click();
    await expect(notice).toBeFocused({ timeout: 5_000 });
  }).toPass();
  await expect(notice).toContainText(`born ${plainDateWords(person.bornOn)}`);
  await expect(notice).toContainText("same date of birth and a similar name, same phone");
  await expect(page.getByLabel("Family name")).toHaveValue(person.familyName);
  await notice.getByRole("link", { name: person.name }).click();
  await expect(page).toHaveURL(record);
}
