import type { Page } from "@playwright/test";
import { expectAccessible } from "./support/accessible";
import { keepAnswers, readClinicalText } from "./support/clinical-text";
import { bookedVisit, read } from "./support/desk";
import { linesOf, sheetOf } from "./support/desk-visit";
import { expect, signIn, test } from "./support/journey";

async function opens(page: Page, address: string): Promise<void> {
  const answer = await page.goto(address);
  expect(answer?.status(), address).toBe(200);
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
}

/** Presses a key until its dialog stands: keys work once the page has woken. */
async function openByKey(page: Page, key: string, title: string | RegExp) {
  const dialog = page.getByRole("dialog", { name: title });
  await expect(async () => {
    if (!(await dialog.isVisible())) await page.keyboard.press(key);
    await expect(dialog).toBeVisible({ timeout: 5_000 });
  }).toPass();
  return dialog;
}

async function closeByKey(page: Page): Promise<void> {
  await page.keyboard.press("Escape");
  await expect(page.getByRole("dialog")).toHaveCount(0);
}

test("the diary can be read and worked by everyone, its dialogs open", async ({ page }) => {
  test.slow();
  await signIn(page, "reception");
  const visit = await bookedVisit(page);
  await opens(page, `/diary?day=${visit.day}&site=${visit.site.id}&at=${visit.id}`);
  await expect(sheetOf(page).getByRole("heading", { level: 2 })).toBeVisible();
  await expectAccessible(page);

  await openByKey(page, "m", `Move ${visit.patient.name}`);
  await expectAccessible(page);
  await closeByKey(page);

  const cancelling = await openByKey(page, "x", `Cancel ${visit.patient.name}`);
  await cancelling.getByRole("button", { name: "Cancel the appointment" }).click();
  await expect(cancelling.getByRole("alert")).toBeFocused();
  await expectAccessible(page);
  await closeByKey(page);

  await page.getByRole("button", { name: "Recent changes", exact: true }).click();
  await expect(page.getByRole("dialog", { name: "Recent changes" })).toBeVisible();
  await expectAccessible(page);
  await closeByKey(page);

  await opens(page, `/diary/week?therapist=${visit.therapist.id}&day=${visit.day}`);
  await expect(page.getByRole("button", { name: new RegExp(visit.patient.name) })).toBeVisible();
  await expectAccessible(page);

  await opens(page, `/diary/find?patient=${visit.patient.id}&service=${visit.service.id}`);
  await expect(linesOf(page)).not.toHaveCount(0);
  await expectAccessible(page);
  await openByKey(page, "b", "Book an appointment");
  await expectAccessible(page);
});

test("the desk's other pages can be read and worked by everyone", async ({ page }) => {
  test.slow();
  await signIn(page, "reception");
  const { patient } = await bookedVisit(page);
  const record = `/patients/${patient.id}`;
  const addresses = [
    "/today",
    "/patients",
    record,
    `${record}/edit`,
    `${record}/money`,
    "/messages",
    "/account",
  ];
  for (const address of addresses) {
    await opens(page, address);
    await expectAccessible(page);
  }

  await opens(page, "/patients/new");
  const summary = page.getByRole("alert").filter({ hasText: "The patient is not saved yet" });
  await expect(async () => {
    await page.getByRole("button", { name: "Register patient" }).click();
    await expect(summary).toBeVisible({ timeout: 5_000 });
  }).toPass();
  await expectAccessible(page);
  await page.getByRole("button", { name: "Add a surgery that is not in the list" }).click();
  await expect(page.getByRole("dialog", { name: "Add a surgery" })).toBeVisible();
  await expectAccessible(page);
  await closeByKey(page);

  for (const key of ["?", "c"]) {
    await openByKey(page, key, /./);
    await expectAccessible(page);
    await closeByKey(page);
  }
});

test("no clinical text reaches the desk", async ({ page, browser }) => {
  test.slow();
  const room = await browser.newContext();
  const therapist = await room.newPage();
  await signIn(therapist, "therapist");
  const clinical = await readClinicalText(therapist, ["Tamworth", "an"]);
  await room.close();
  expect(clinical.noteIds.length).toBeGreaterThan(3);
  expect(clinical.passages.length).toBeGreaterThan(20);

  await signIn(page, "reception");
  const kept = await keepAnswers(page);
  const addresses = ["/today", "/diary", "/diary/week", "/diary/find", "/patients", "/messages", "/billing"];
  for (const address of addresses) await opens(page, address);
  for (const id of clinical.patientIds) {
    await opens(page, `/patients/${id}`);
    await opens(page, `/patients/${id}/edit`);
    await opens(page, `/patients/${id}/money`);
    const kinds = ["notes", "measures", "letters", "all"];
    for (const kind of kinds) await fetchIn(page, `/api/patients/${id}/timeline?kind=${kind}`, 200);
    await fetchIn(page, `/api/clinical/episodes?patientId=${id}`, 403);
  }
  for (const id of clinical.noteIds) await fetchIn(page, `/api/clinical/notes/${id}`, 403);

  const answers = kept.map(({ url, body }) => ({
    url,
    found: clinical.passages.filter((text) => body.includes(text)),
  }));
  expect(answers.filter(({ found }) => found.length > 0)).toEqual([]);
  // The same look finds what the desk may read, so an empty finding is no blindness.
  const [known = ""] = clinical.patientIds;
  const { givenName } = await read<{ givenName: string }>(page, `/api/patients/${known}`);
  expect(kept.filter(({ body }) => body.includes(givenName)).length).toBeGreaterThan(2);
});

/** Asks as the page's own scripts do, so that the answer is kept like every other. */
async function fetchIn(page: Page, path: string, status: number): Promise<void> {
  expect(await page.evaluate(async (address) => (await fetch(address)).status, path), path).toBe(status);
}
