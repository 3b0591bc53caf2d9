import { expectAccessible } from "./support/accessible";
import { type DemoPerson, expect, signIn, test } from "./support/journey";

test("a wrong password is refused in words, and what was typed is kept", async ({ page }) => {
  await page.goto("/sign-in");
  await expectAccessible(page);
  await page.getByLabel("E-mail address").fill("reception@marram.example");
  await page.getByLabel("Password").fill("not the password");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "do not match" })).toBeVisible();
  await expect(page.getByLabel("E-mail address")).toHaveValue("reception@marram.example");
});

test("a page asked for without a session leads to the sign-in", async ({ page }) => {
  await page.goto("/today");
  await expect(page).toHaveURL(/\/sign-in/);
});

const people: readonly DemoPerson[] = ["owner", "therapist", "reception", "accounts", "otherOwner"];

for (const person of people) {
  test(`every section that ${person} is offered opens`, async ({ page }) => {
    await signIn(page, person);
    const tabs = page.getByRole("banner").getByRole("navigation").getByRole("link");
    const addresses = await tabs.evaluateAll((links) => links.map((link) => link.getAttribute("href") ?? ""));
    expect(addresses.length).toBeGreaterThan(1);
    for (const address of addresses) {
      const answer = await page.goto(address);
      expect(answer?.status(), address).toBe(200);
      await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
      await expectAccessible(page);
    }
  });
}
