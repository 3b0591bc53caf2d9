import type { Page } from "@playwright/test";
import type { LetterView } from "@withy/contracts/letters";
import { expectAccessible } from "./accessible";
import { read } from "./desk";
import { expect } from "./journey";
import { waitForMail } from "./mailbox";
import { expectPdf, pressUntil, type Treated } from "./treatment";

/** From the episode's own page to the letter about it. */
export async function draftFromEpisode(page: Page, patient: Treated, episodeId: string): Promise<string> {
  await page.goto(`/patients/${patient.id}/episodes/${episodeId}`);
  await page.getByRole("link", { name: "Discharge letter" }).click();
  await pressUntil(
    () =>
      page
        .getByRole("button", { name: "Write the letter about Pain behind the kneecap" })
        .click({ timeout: 30_000 }),
    () => page.waitForURL(/\/letters\/[0-9a-f-]{36}$/, { timeout: 60_000 }),
  );
  return page.url().slice(-36);
}

/** The record speaks for itself, a sentence is put into other words, and nothing stands in the way of signing. */
export async function editSentence(page: Page, { gp }: Treated): Promise<void> {
  const sheet = page.getByRole("article", { name: "The letter" });
  await expect(sheet).toContainText(gp.name);
  const sentences = sheet.getByRole("textbox");
  await expect.poll(() => sentences.evaluateAll(valuesOf)).toContain("Pain behind the kneecap, left side.");
  const written = await sentences.evaluateAll(valuesOf);
  expect(
    written.filter((text) => /Pain.*6/.test(text)),
    "the pain rating",
  ).not.toEqual([]);
  expect(
    written.filter((text) => /Home programme of seven exercises/.test(text)),
    "the programme",
  ).not.toEqual([]);
  const diagnosis = sheet.getByRole("textbox", { name: /^Diagnos.*, sentence 1$/ });
  const side = page.getByRole("complementary", { name: "Before it goes" });
  const wording = "Pain behind the left kneecap from loading, without swelling.";
  await pressUntil(
    () => diagnosis.fill(wording),
    () => expect(sheet.getByText("edited", { exact: true })).toBeVisible({ timeout: 5_000 }),
  );
  await expect(side.getByRole("status")).toHaveText("Saved", { timeout: 30_000 });
  await page.reload();
  await expect(diagnosis).toHaveValue(wording);
  await expect(side.getByRole("listitem").filter({ hasText: "Put right first" })).toHaveCount(0);
  await expect(side).toContainText("Every note is signed");
}

const valuesOf = (fields: (HTMLElement | SVGElement)[]) =>
  fields.map((field) => (field as HTMLTextAreaElement).value);

/** One act at the end of care: signed, the episode discharged, and on its way to the doctor. */
export async function signAndSend(page: Page, { name, gp }: Treated): Promise<void> {
  const dialog = page.getByRole("dialog", { name: `Sign the letter about ${name}` });
  await pressUntil(
    () => page.getByRole("button", { name: /^Sign and send…/ }).click({ timeout: 5_000 }),
    () => expect(dialog).toBeVisible({ timeout: 10_000 }),
  );
  await expect(dialog.getByLabel("Discharge with this letter")).toBeChecked();
  await expect(dialog.getByLabel(`To ${gp.name}: ${gp.email}`)).toBeChecked();
  await dialog.getByRole("button", { name: "Sign and send" }).click();
  await expect(dialog.getByText("Choose how the episode ended.").first()).toBeVisible();
  await dialog.getByLabel("Goals partly met").check();
  await dialog.getByRole("button", { name: "Sign and send" }).click();
  const way = page.getByRole("complementary", { name: "The letter's way" });
  await expect(way).toContainText(gp.email, { timeout: 60_000 });
  const sheet = page.getByRole("article", { name: "The letter" });
  await expect(sheet.getByRole("textbox")).toHaveCount(0);
  await expect(sheet).toContainText("Pain behind the left kneecap from loading, without swelling.");
  await expect(sheet).toContainText("PH100202");
  await expectPdf(page, (await way.getByRole("link", { name: "PDF" }).getAttribute("href")) ?? "");
}

/**
 * The doctor's mail holds no clinical word and no date of birth, only a private page that asks for it, refuses another
 * and opens the letter.
 */
export async function readAsDoctor(page: Page, letterId: string, patient: Treated): Promise<void> {
  const letter = await read<LetterView>(page, `/api/letters/${letterId}`);
  const mail = await waitForMail(patient.gp.email, new RegExp(letter.reference), 60_000);
  expect(mail.text).not.toContain(patient.familyName);
  expect(mail.text).not.toContain("kneecap");
  expect(mail.text).not.toContain("1971");
  expect(mail.attachments).toEqual([]);
  const link = /https?:\/\/\S+\/link\/\S+\/letter/.exec(mail.text)?.[0] ?? "";
  await page.goto(new URL(link).pathname);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("A letter from Marram Physiotherapy");
  await expectAccessible(page);
  await giveDate(page, "18 5 1971");
  await expect(page.getByRole("link", { name: /born on another day/ })).toBeVisible({ timeout: 30_000 });
  await expect(page.getByLabel("The patient's date of birth")).toHaveValue("18 5 1971");
  await expectAccessible(page);
  await expect(page.getByRole("button", { name: "Open the letter" })).toHaveCount(0);
  await giveDate(page, patient.bornOn);
  await expect(page.getByRole("button", { name: "Open the letter" })).toBeVisible({ timeout: 30_000 });
  await expectAccessible(page);
  const opened = page.context().waitForEvent("response", {
    predicate: (response) => response.url().endsWith("/letter/pdf"),
    timeout: 60_000,
  });
  await page.getByRole("button", { name: "Open the letter" }).click();
  const answer = await opened;
  expect(answer.status()).toBe(200);
  expect(answer.headers()["content-type"]).toBe("application/pdf");
  for (const other of page.context().pages()) if (other !== page) await other.close();
  const after = await read<LetterView>(page, `/api/letters/${letterId}`);
  expect(after.deliveries.map((delivery) => delivery.firstOpenedAt)).not.toContain(null);
}

async function giveDate(page: Page, bornOn: string): Promise<void> {
  await page.getByLabel("The patient's date of birth").fill(bornOn);
  await page.getByRole("button", { name: "Go on to the letter" }).click();
}

export async function seeDischarged(page: Page, { id }: Treated, episodeId: string): Promise<void> {
  await page.goto(`/patients/${id}/episodes/${episodeId}`);
  await expect(page.getByText(/^discharged /).first()).toBeVisible();
  await expect(page.getByRole("button", { name: "Open it again" })).toBeVisible();
  await expect(page.getByRole("complementary", { name: "About the episode" })).toContainText(
    "goals partly met",
  );
}
