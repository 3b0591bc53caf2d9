import { test as base, expect, type Page } from "@playwright/test";

/** What a browser says when something is wrong with a page; a journey that meets any of it has failed. */
export const test = base.extend<{ complaints: string[] }>({
  complaints: [
    async ({ page }, use) => {
      const complaints: string[] = [];
      page.on("console", (message) => {
        // The browser writes an error line for each answer over 399; refusals are asked for on purpose in journeys.
        const isRefusal = message.text().startsWith("Failed to load resource");
        if (message.type() === "error" && !isRefusal) complaints.push(`console: ${message.text()}`);
      });
      page.on("pageerror", (error) => complaints.push(`script: ${error.message}`));
      page.on("response", (response) => {
        if (response.status() >= 500) complaints.push(`${response.status()} ${response.url()}`);
      });
      await use(complaints);
      expect(complaints).toEqual([]);
    },
    { auto: true },
  ],
});

export { expect };

const accounts = {
  owner: "owner@marram.example",
  therapist: "therapist@marram.example",
  reception: "reception@marram.example",
  accounts: "accounts@marram.example",
  otherOwner: "owner@cairnfirth.example",
} as const;
export type DemoPerson = keyof typeof accounts;

export const demoPassword = process.env.WITHY_E2E_PASSWORD ?? "easterhaven-tide-26";

/** Signs in through the form, as a person does, and waits until the first page stands. */
export async function signIn(page: Page, person: DemoPerson): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail address").fill(accounts[person]);
  await page.getByLabel("Password").fill(demoPassword);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => !url.pathname.startsWith("/sign-in"));
  await expect(page.getByRole("main")).toBeVisible();
}
