import { expectAccessible } from "./support/accessible";
import { expect, test } from "./support/journey";

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
