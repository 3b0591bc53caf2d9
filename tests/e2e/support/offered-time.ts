import type { Browser, Page } from "@playwright/test";
import type { AppointmentView, BookingChoicesView } from "@withy/contracts/diary";
import { expectAccessible } from "./accessible";
import { type NewPerson, read, registered, write } from "./desk";
import { sheetOf } from "./desk-visit";
import { expect } from "./journey";
import { waitForMail } from "./mailbox";

export type Person = NewPerson & { id: string };

export async function cancelVisit(page: Page, visit: AppointmentView): Promise<void> {
  await page.goto(`/diary?${new URLSearchParams({ day: visit.day, site: visit.site.id, at: visit.id })}`);
  await sheetOf(page).getByRole("button", { name: "Cancel, and say why" }).click();
  const dialog = page.getByRole("dialog", { name: `Cancel ${visit.patient.name}` });
  await dialog.getByLabel("Why", { exact: true }).fill("Away");
  await dialog.getByRole("button", { name: "Cancel the appointment" }).click();
  await expect(sheetOf(page)).toContainText("Cancelled by the patient: Away");
}

/** From the patient's record, through the form. */
export async function addByForm(page: Page, visit: AppointmentView): Promise<Person> {
  const person = await registered(page);
  await page.goto(`/patients/${person.id}`);
  await page.getByRole("link", { name: "Waiting list", exact: true }).click();
  const dialog = page.getByRole("dialog", { name: "Add to the waiting list" });
  await expect(dialog.getByLabel("Patient", { exact: true })).toHaveValue(person.name);
  await dialog.getByRole("button", { name: "Add to the list" }).click();
  await expect(dialog.getByRole("link", { name: "Choose what the visit is for" })).toBeVisible();
  await dialog.getByLabel("For", { exact: true }).selectOption(visit.service.id);
  await dialog.getByRole("radio", { name: "Urgent" }).check({ force: true });
  await dialog.getByRole("button", { name: "Add to the list" }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByRole("row").filter({ hasText: person.name })).toContainText("Any time");
  return person;
}

export async function addByApi(page: Page): Promise<Person> {
  const person = await registered(page);
  const { services } = await read<BookingChoicesView>(page, "/api/diary/choices");
  const serviceId = services.find(({ kind }) => kind === "initial")?.id ?? "";
  await write(page, "/api/diary/waiting", { patientId: person.id, serviceId, urgency: "urgent", wishes: {} });
  return person;
}

/** From the cancelled visit, to these two and nobody else. */
export async function offerTo(page: Page, visit: AppointmentView, people: readonly Person[]): Promise<void> {
  await page.goto(`/diary?${new URLSearchParams({ day: visit.day, site: visit.site.id, at: visit.id })}`);
  await sheetOf(page).getByRole("link", { name: "Offer this time to the waiting list" }).click();
  await expect(page.getByRole("heading", { level: 1 })).toContainText(`${visit.startTime}`);
  await expect(page.getByRole("heading", { name: /^It suits/ })).toBeVisible();
  for (const box of await page.getByRole("main").getByRole("checkbox").all())
    if (await box.isEnabled()) await box.uncheck();
  for (const { name } of people) await page.getByRole("checkbox", { name: new RegExp(`^${name}`) }).check();
  await expectAccessible(page);
  await page.getByRole("button", { name: `Offer to ${people.length} people` }).click();
  await page.waitForURL("**/diary/waiting");
  const round = page.getByRole("article", { name: new RegExp(`${visit.startTime}$`) });
  await expect(round.getByText("No answer yet")).toHaveCount(people.length);
}

async function linkOf(person: Person): Promise<string> {
  const mail = await waitForMail(person.email, /^A time has come free/);
  const link = /https?:\/\/\S+\/link\/[\w-]{43}\/offer/.exec(mail.text)?.[0];
  if (!link) throw new Error("The mail carries no link.");
  return link;
}

/** On a phone of their own, without any script. */
export async function acceptAndMiss(browser: Browser, first: Person, second: Person): Promise<void> {
  const context = await browser.newContext({
    javaScriptEnabled: false,
    viewport: { width: 390, height: 800 },
  });
  const phone = await context.newPage();
  await phone.goto(await linkOf(first));
  await expect(phone.getByRole("main")).toContainText("The first to accept has it.");
  await phone.getByRole("button", { name: "Accept this time" }).click();
  await expect(phone.getByRole("heading", { level: 1 })).toHaveText("The time is yours");
  await phone.goto(await linkOf(second));
  await expect(phone.getByRole("heading", { level: 1 })).toHaveText("This time has gone");
  await expect(phone.getByRole("main")).toContainText("You stay on our list");
  await expect(phone.getByRole("button")).toHaveCount(0);
  await waitForMail(second.email, /has gone$/);
  await waitForMail(first.email, /^Your appointment on/);
  await context.close();
}
