import type { Page } from "@playwright/test";
import { expectAccessible } from "./accessible";
import { demoPassword, expect } from "./journey";
import { type CaughtMail, waitForMail } from "./mailbox";

export interface Colleague {
  readonly name: string;
  readonly givenName: string;
  readonly familyName: string;
  readonly email: string;
}

/** The owner asks a receptionist for one site in; a form without an address is refused and keeps the rest. */
export async function invite(page: Page, colleague: Colleague): Promise<void> {
  await page.goto("/settings");
  const dialog = page.getByRole("dialog", { name: "Invite a colleague" });
  await expect(async () => {
    await page.getByRole("button", { name: "Invite a colleague" }).click();
    await expect(dialog).toBeVisible();
  }).toPass();
  await dialog.getByLabel("Given name").fill(colleague.givenName);
  await dialog.getByLabel("Family name").fill(colleague.familyName);
  await dialog.getByLabel("Works as").fill("receptionist");
  await dialog.getByLabel("Home site").selectOption({ label: "Upper Wharf" });
  await dialog.getByRole("group", { name: "Receptionist" }).getByLabel("Upper Wharf").check();
  const send = dialog.getByRole("button", { name: "Send the invitation" });
  await send.click();
  await expect(dialog.getByRole("alert")).toContainText("Enter an e-mail address in full");
  await expect(dialog.getByLabel("Given name")).toHaveValue(colleague.givenName);
  await dialog.getByLabel("E-mail address").fill(colleague.email);
  await send.click();
  await expect(dialog).toBeHidden();
  await expect(staffRow(page, colleague)).toContainText("Receptionist at Upper Wharf");
  await expect(staffRow(page, colleague)).toContainText("invited, not joined");
}

export const staffRow = (page: Page, { name }: Colleague) =>
  page
    .getByRole("table", { name: "Staff" })
    .getByRole("row")
    .filter({ has: page.getByRole("rowheader", { name: new RegExp(name) }) });

const pathIn = (mail: CaughtMail): string => {
  const link = /https?:\/\/\S+/.exec(mail.text)?.[0];
  if (link === undefined) throw new Error("The message carries no link.");
  return new URL(link).pathname;
};

/** Opens the link of a message and sets a password, which is first typed in two ways. */
export async function setPassword(page: Page, path: string, password: string): Promise<void> {
  await page.goto(path);
  const [first, again] = [
    page.getByLabel("New password"),
    page.getByLabel("The same password again"),
  ] as const;
  await expectAccessible(page);
  await first.fill(password);
  await again.fill(`${password} or so`);
  await page.getByRole("button", { name: "Set the password" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "The two passwords differ." })).toBeVisible();
  await expectAccessible(page);
  await first.fill(password);
  await again.fill(password);
  await page.getByRole("button", { name: "Set the password" }).click();
  await page.waitForURL("**/sign-in?ready=*");
  await expect(page.getByText("Your password is set. Sign in with it.")).toBeVisible();
  await page.goto(path);
  await expect(page.getByRole("heading", { level: 1 })).toContainText("no longer works");
  await expectAccessible(page);
}

export async function join(page: Page, { email, givenName }: Colleague, password: string): Promise<void> {
  const path = pathIn(await waitForMail(email, /^Your account at Marram Physiotherapy$/));
  await page.goto(path);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(`Welcome, ${givenName}`);
  await setPassword(page, path, password);
}

export async function enter(page: Page, email: string, password: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail address").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
}

/** What a receptionist of one site is offered, and what stays shut when its address is typed. */
export async function expectDeskOnly(page: Page): Promise<void> {
  await page.waitForURL("**/today");
  const sections = page.getByRole("navigation", { name: "Sections" }).getByRole("link");
  await expect(sections).toHaveText([/^Today/, /^Diary/, /^Patients/, /^Accounts/]);
  for (const address of ["/settings", "/settings/audit", "/reports/month", "/notes", "/letters"]) {
    const answer = await page.goto(address);
    expect(answer?.status(), address).toBe(404);
    await expect(page.getByRole("heading", { level: 1 })).toHaveText("This page is not in the book");
  }
  const sites = await page.request.get("/api/diary/choices");
  expect(((await sites.json()) as { sites: { name: string }[] }).sites.map(({ name }) => name)).toEqual([
    "Upper Wharf",
  ]);
}

/** Asks for a new password as someone who has forgotten theirs, and sets it from the mail. */
export async function resetPassword(page: Page, email: string, password: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByRole("link", { name: "I forgot my password" }).click();
  await page.getByLabel("E-mail address").fill(email);
  await page.getByRole("button", { name: "Send the link" }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Look in your mail");
  await expectAccessible(page);
  await setPassword(page, pathIn(await waitForMail(email, /^Choose a new password$/)), password);
}

/** The page of someone whose session was ended leads to the sign-in at the next step. */
export async function expectSignedOut(page: Page): Promise<void> {
  await page.goto("/today");
  await expect(page).toHaveURL(/\/sign-in/);
}

export const firstPassword = `${demoPassword} first`;
export const secondPassword = `${demoPassword} second`;
