import type { Page } from "@playwright/test";
import type { NoteView } from "@withy/contracts/clinical";
import { expect } from "./journey";
import { assessment, assessmentBody, pressUntil, send, type Treated } from "./treatment";

const savedMark = /^Saved \d\d:\d\d$/;

/** The field under a heading, whose name also says that it is needed while it is empty. */
export const fieldOf = (page: Page, heading: string) =>
  page.getByRole("textbox", { name: new RegExp(`^${heading}( needed)?$`) });

/** Sees the visit among those of the day and begins its note, with a new episode for the left knee. */
export async function openEpisodeFromVisit(page: Page, { name }: Treated): Promise<void> {
  await page.goto("/notes");
  await expect(page.getByRole("heading", { level: 1 })).toContainText("Notes to sign");
  await expect(page.getByText(/to sign from today|Nothing to sign from today yet/)).toBeVisible();
  const today = page.getByRole("region", { name: "Today" });
  await expect(today.getByRole("link", { name, exact: true })).toBeVisible();
  const choose = page.getByRole("dialog", { name: "Which episode is this visit for?" });
  await pressUntil(
    () => today.getByRole("button", { name: `Write the note of ${name}` }).click({ timeout: 5_000 }),
    () => expect(choose).toBeVisible({ timeout: 15_000 }),
  );
  await expect(choose).toContainText("This patient has no open episode.");
  await choose.getByRole("link", { name: "Open a new episode" }).click();
  await expect(page.getByLabel("Working problem")).toBeVisible({ timeout: 60_000 });
  await page.getByRole("button", { name: "Open it and write the note" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "Choose the region" })).toBeVisible();
  await page.getByLabel("Region", { exact: true }).selectOption("knee");
  await page.getByRole("radiogroup", { name: "Side" }).getByText("Left", { exact: true }).click();
  await page.getByLabel("Working problem").fill("Pain behind the kneecap");
  await page.getByLabel("Goals").fill("Take the stairs without the rail");
  await page.getByLabel("Planned visits").fill("6");
  await page.getByRole("button", { name: "Open it and write the note" }).click();
  await page.waitForURL(/\/notes\/[0-9a-f-]{36}$/, { timeout: 60_000 });
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(name);
  await expect(page.getByRole("main")).toContainText("Left knee");
}

/** Writes under every heading, waits until it is kept, and finds it again after a reload. */
export async function writeWithAutosave(page: Page): Promise<void> {
  for (const [heading, , text] of assessment) await fieldOf(page, heading).fill(text);
  await expect(page.getByText(savedMark)).toBeVisible({ timeout: 30_000 });
  await page.reload();
  for (const [heading, , text] of assessment) await expect(fieldOf(page, heading)).toHaveValue(text);
  await expect(page.getByText(savedMark)).toBeVisible();
}

/** Records pain, three activities and the chair stand, each scored as it is typed and then shown on the note. */
export async function recordMeasures(page: Page): Promise<void> {
  const panel = page.getByRole("region", { name: "Measures" });
  const measured = page.getByRole("table", { name: "Measured at this visit" });
  const choice = panel.getByLabel("Measure", { exact: true });
  const begin = async (key: string, button: string) => {
    await choice.selectOption(key);
    const record = panel.getByRole("button", { name: button });
    await pressUntil(
      () => panel.getByRole("button", { name: "record", exact: true }).click({ timeout: 5_000 }),
      () => expect(record).toBeVisible({ timeout: 5_000 }),
    );
    return record;
  };
  const pain = await begin("pain-rating", "Record Pain");
  await panel
    .getByRole("radiogroup", { name: "Pain rating, 0 to 10" })
    .getByText("6", { exact: true })
    .click();
  await expect(panel.getByRole("status")).toHaveText("Pain: 6");
  await pain.click();
  await expect(measured.getByRole("row", { name: /^Pain rating, 0 to 10 6/ })).toBeVisible();

  const own = await begin("patient-specific-functional", "Record PSFS");
  const activities = [
    ["Stairs down", "3"],
    ["Kneeling", "2"],
    ["Rowing", "5"],
  ] as const;
  for (const [i, [activity, score]] of activities.entries()) {
    await panel.getByRole("textbox", { name: `Activity ${i + 1}`, exact: true }).fill(activity);
    await panel.getByRole("textbox", { name: `Activity ${i + 1}, 0 to 10` }).fill(score);
  }
  await expect(panel.getByRole("status")).toHaveText("Own activities: 3.3");
  await own.click();
  await expect(measured.getByRole("row", { name: /^Patient-specific functional scale 3\.3/ })).toBeVisible();

  const stand = await begin("chair-stand-30", "Record Chair stand");
  await panel.getByLabel("Full stands in 30 seconds").fill("11");
  await expect(panel.getByRole("status")).toHaveText("Stands: 11");
  await stand.click();
  await expect(measured.getByRole("row", { name: /^30-second chair stand 11/ })).toBeVisible();
}

/** Signs; from then on the page has no field and the server refuses the old way in. */
export async function signForGood(page: Page, noteId: string, { name }: Treated): Promise<void> {
  await page.goto(`/notes/${noteId}`);
  const dialog = page.getByRole("dialog", { name: `Sign the note of ${name}` });
  await pressUntil(
    () => page.getByRole("button", { name: "Sign…" }).click({ timeout: 5_000 }),
    () => expect(dialog).toBeVisible({ timeout: 5_000 }),
  );
  await dialog.getByRole("button", { name: "Sign for good" }).click();
  await expect(page.getByText("Signed by Nia Prosser, PH100202")).toBeVisible({ timeout: 30_000 });
  await expect(page.getByRole("textbox")).toHaveCount(0);
  await expect(page.getByRole("button", { name: "Sign…" })).toHaveCount(0);

  const note = (await (await page.request.get(`/api/clinical/notes/${noteId}`)).json()) as NoteView;
  expect(note.state).toBe("signed");
  const changed = { ...assessmentBody, plan: "Something else" };
  const answer = await send(page, "PUT", `/api/clinical/notes/${noteId}/draft`, {
    version: note.version,
    body: changed,
  });
  expect(answer.ok()).toBe(false);
  expect(await answer.json()).toMatchObject({
    kind: "note-signed",
    detail: "This note is signed and can no longer be changed. Write an addendum instead.",
  });
  await page.reload();
  const body = page.getByRole("region", { name: "Initial assessment" });
  for (const [, , text] of assessment) await expect(body).toContainText(text);
  await expect(body).not.toContainText("Something else");
}

export async function addAddendum(page: Page): Promise<void> {
  const dialog = page.getByRole("dialog", { name: "Add an addendum" });
  await pressUntil(
    () => page.getByRole("button", { name: "Add an addendum" }).click({ timeout: 5_000 }),
    () => expect(dialog).toBeVisible({ timeout: 5_000 }),
  );
  await dialog.getByLabel("Why you are adding this").fill("Left out at the visit");
  await dialog.getByRole("button", { name: "Add it" }).click();
  await expect(dialog.getByText("Write what you want to add.").first()).toBeVisible();
  await expect(dialog.getByLabel("Why you are adding this")).toHaveValue("Left out at the visit");
  await dialog.getByLabel("What you are adding").fill("Wears an old knee sleeve when rowing.");
  await dialog.getByRole("button", { name: "Add it" }).click();
  const addendum = page.getByRole("region", { name: "Addendum" });
  await expect(addendum).toContainText("Addendum by Nia Prosser, PH100202");
  await expect(addendum).toContainText("Reason: Left out at the visit");
  await expect(addendum).toContainText("Wears an old knee sleeve when rowing.");
}
