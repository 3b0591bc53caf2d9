import type { Locator, Page } from "@playwright/test";
import type { FoundTimeView } from "@withy/contracts/diary";
import { plainDateWords, shortDate, titleDate } from "@withy/core/date-words";
import ical from "ical.js";
import { answeredTimes, cellWords, type NewPerson, when } from "./desk";
import { expect } from "./journey";
import { readAttachment, waitForMail } from "./mailbox";

export const sheetOf = (page: Page) => page.getByRole("complementary", { name: "The appointment" });
export const cellOf = (page: Page, time: FoundTimeView, name: string, state: string) =>
  page.getByRole("gridcell", { name: new RegExp(`^${cellWords(time, name)}.+, ${state}$`) });
export const linesOf = (page: Page) =>
  page.getByRole("region", { name: /^\d+ times?$/ }).getByRole("listitem");

export async function findTimes(page: Page, person: NewPerson): Promise<readonly FoundTimeView[]> {
  await page.goto("/diary/find");
  await chooseOption(page, page.getByLabel("Patient", { exact: true }), person.name);
  await page.getByLabel("For", { exact: true }).selectOption({ label: "Initial assessment, 45 minutes" });
  const lines = linesOf(page);
  const allSay = (words: string) =>
    expect(async () => {
      const texts = await lines.allTextContents();
      expect(texts.length).toBeGreaterThan(0);
      for (const text of texts) expect(text).toContain(words);
    }).toPass();
  await expect(lines).not.toHaveCount(0);
  const site = page.getByRole("group", { name: "Sites" }).getByText("Tollhouse Lane");
  await site.click();
  await allSay(", Tollhouse Lane");
  await site.click();
  await page.getByLabel("Therapist", { exact: true }).selectOption({ label: "Nia Prosser" });
  await allSay("Nia Prosser");
  await page.getByLabel("Therapist", { exact: true }).selectOption({ label: "Anyone" });
  const answer = answeredTimes(page);
  await page.getByLabel("Not before").fill("in 2 weeks");
  const times = await answer;
  await expect(lines).toHaveCount(times.length);
  for (const [i, time] of times.entries())
    await expect(lines.nth(i).getByRole("heading")).toHaveText(`${titleDate(time.day)}, ${time.startTime}`);
  return times;
}

/** Types until the match is offered: what is typed before the page has woken is not heard. */
export async function chooseOption(page: Page, field: Locator, name: string): Promise<void> {
  await expect(async () => {
    await field.fill("");
    await field.fill(name);
    await page.getByRole("option", { name: new RegExp(name) }).click({ timeout: 5_000 });
  }).toPass();
  await expect(field).toHaveValue(name);
}

export async function book(page: Page, time: FoundTimeView, person: NewPerson): Promise<void> {
  await linesOf(page)
    .first()
    .getByRole("button", { name: /^Book / })
    .click();
  const dialog = page.getByRole("dialog", { name: "Book an appointment" });
  await expect(dialog.getByLabel("Patient", { exact: true })).toHaveValue(person.name);
  await dialog.getByLabel("Desk note").fill("Asked for the ground floor");
  await dialog.getByRole("button", { name: `Book ${when(time)}` }).click();
  await page.waitForURL(new RegExp(`/diary\\?day=${time.day}&site=${time.site.id}&at=`));
  await expect(sheetOf(page).getByRole("link", { name: person.name })).toBeVisible();
  await expect(sheetOf(page)).toContainText(
    `with${time.therapist.name}, in ${time.room.name}, ${time.site.name}`,
  );
  const cell = cellOf(page, time, person.name, "Booked");
  await expect(cell).toHaveAttribute("aria-selected", "true");
  const column = await page
    .getByRole("columnheader", { name: time.therapist.name })
    .getAttribute("aria-colindex");
  await expect(cell).toHaveAttribute("aria-colindex", column ?? "");
}

export async function readInvitation(time: FoundTimeView, person: NewPerson): Promise<void> {
  const mail = await waitForMail(person.email, /^Your appointment on /);
  expect(mail.text).toContain(time.therapist.name);
  const file = mail.attachments.find((one) => one.contentType.startsWith("text/calendar"));
  const calendar = new ical.Component(ical.parse(await readAttachment(file?.path ?? "")));
  const event = new ical.Event(calendar.getFirstSubcomponent("vevent") ?? undefined);
  expect(event.startDate.toJSDate().toISOString()).toBe(time.startsAt);
  expect(event.endDate.toJSDate().toISOString()).toBe(time.endsAt);
  expect(`${mail.text} ${calendar}`).not.toContain("Initial assessment");
}

export async function seeWeek(page: Page, time: FoundTimeView, person: NewPerson): Promise<void> {
  await page.getByRole("link", { name: "Week", exact: true }).click();
  await page.waitForURL(/\/diary\/week\?/);
  await expect(page.getByRole("heading", { level: 1 })).toContainText(`${time.therapist.name}, week of`);
  const words = `${titleDate(time.day)}, ${time.startTime} to ${time.endTime}, ${person.name}, Initial assessment`;
  await page.getByRole("button", { name: new RegExp(words) }).click();
  await page.waitForURL(/\/diary\?.*at=/);
  await expect(cellOf(page, time, person.name, "Booked")).toBeVisible();
}

export async function move(page: Page, to: FoundTimeView, person: NewPerson): Promise<void> {
  await sheetOf(page).getByRole("button", { name: /^Move/ }).click();
  const dialog = page.getByRole("dialog", { name: `Move ${person.name}` });
  await dialog.getByLabel("Day", { exact: true }).fill(shortDate(to.day));
  await dialog.getByLabel("At", { exact: true }).fill(to.startTime);
  await dialog.getByLabel("Site", { exact: true }).selectOption({ label: to.site.name });
  await dialog.getByLabel("With", { exact: true }).selectOption({ label: to.therapist.name });
  await dialog.getByLabel("Room", { exact: true }).selectOption({ label: "Any free room" });
  await dialog.getByRole("button", { name: `Move to ${when(to)}` }).click();
  await expect(dialog).toBeHidden();
  await expect(sheetOf(page)).toContainText(`with${to.therapist.name}`);
  await expect(cellOf(page, to, person.name, "Booked")).toBeVisible();
  const mail = await waitForMail(person.email, /^New time for your appointment: /);
  expect(mail.subject).toContain(plainDateWords(to.day));
}

export async function cancelAndUndo(page: Page, time: FoundTimeView, person: NewPerson): Promise<void> {
  await sheetOf(page)
    .getByRole("button", { name: /^Cancel/ })
    .click();
  const dialog = page.getByRole("dialog", { name: `Cancel ${person.name}` });
  const confirm = dialog.getByRole("button", { name: "Cancel the appointment" });
  await confirm.click();
  await dialog.getByRole("alert").getByRole("link", { name: "Say why, in a few words" }).click();
  await expect(dialog.getByLabel("Why", { exact: true })).toBeFocused();
  await dialog.getByLabel("Why", { exact: true }).fill("Away that week");
  await confirm.click();
  await expect(dialog).toBeHidden();
  await expect(sheetOf(page)).toContainText("Cancelled by the patient: Away that week");
  await expect(cellOf(page, time, person.name, "Cancelled")).toBeVisible();
  await waitForMail(person.email, /^Cancelled: your appointment on /);
  await sheetOf(page).getByRole("button", { name: "Undo, back to booked" }).click();
  await expect(cellOf(page, time, person.name, "Booked")).toBeVisible();
  await expect(sheetOf(page)).not.toContainText("Away that week");
}
