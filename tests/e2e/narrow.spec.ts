import type { Page } from "@playwright/test";
import type { PatientPage } from "@withy/contracts/patients";
import { read } from "./support/desk";
import { type DemoPerson, expect, signIn, test } from "./support/journey";

// The narrowest window that is reckoned with: a wide one enlarged to four times its size is as narrow.
test.use({ viewport: { width: 320, height: 800 }, hasTouch: true });

const record = (...pages: readonly string[]) => pages.map((page) => `/patients/{patient}${page}`);
const walks: readonly { person: DemoPerson; pages: readonly string[] }[] = [
  {
    person: "reception",
    pages: [
      "/today",
      "/diary",
      "/diary/week",
      "/diary/find",
      "/patients",
      "/patients/new",
      ...record("", "/edit", "/money"),
      "/billing",
      "/billing/drafts",
      "/messages",
      "/account",
    ],
  },
  {
    person: "owner",
    pages: [
      "/today",
      "/notes",
      ...record("", "/measures", "/programme", "/letters"),
      "/exercises",
      "/exercises/sit-to-stand",
      "/letters",
      "/reports/month",
      "/settings",
      "/settings/audit",
    ],
  },
];

/** What sticks out at the right, the widest first; empty when the page fits its window. */
const widerThanWindow = (page: Page) =>
  page.evaluate(() => {
    if (document.documentElement.scrollWidth <= window.innerWidth) return [];
    const out = [...document.body.querySelectorAll("*")].filter(
      (part) => part.getBoundingClientRect().right > window.innerWidth + 0.5,
    );
    return ["the page", ...out.slice(0, 4).map((part) => `${part.localName}.${part.getAttribute("class")}`)];
  });

for (const { person, pages } of walks) {
  test(`no page of ${person} is wider than a window of 320`, async ({ page }) => {
    await signIn(page, person);
    const { rows } = await read<PatientPage>(page, "/api/patients?search=eleri&pageSize=1");
    for (const address of pages) {
      const opened = address.replace("{patient}", rows[0]?.id ?? "");
      const answer = await page.goto(opened);
      expect(answer?.status(), address).toBe(200);
      await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
      await page.waitForLoadState("networkidle");
      expect(await widerThanWindow(page), `what is wider than the window on ${address}`).toEqual([]);
    }
  });
}
