import { shortDate } from "@withy/core/date-words";
import { answeredTimes, registered, someoneNew, when } from "./support/desk";
import { meetDuplicate, meetFieldErrors, register, seeRecord } from "./support/desk-register";
import { markArrived, seeToday } from "./support/desk-today";
import {
  book,
  cancelAndUndo,
  cellOf,
  findTimes,
  linesOf,
  move,
  readInvitation,
  seeWeek,
  sheetOf,
} from "./support/desk-visit";
import { demoPassword, expect, signIn, test } from "./support/journey";
import { pick, retype, tabTo } from "./support/keyboard";

test("the desk's day: register, find a time, book, move, cancel, undo and mark as arrived", async ({
  page,
}) => {
  test.slow();
  await signIn(page, "reception");
  await test.step("Today shows what the diary holds", () => seeToday(page));
  const person = await someoneNew(page);
  await test.step("a form that is not complete is refused field by field", () =>
    meetFieldErrors(page, person));
  const payer = await test.step("registers", () => register(page, person));
  await test.step("the record says what was typed", () => seeRecord(page, person, payer));
  await test.step("the same person again is noticed", () => meetDuplicate(page, person));
  const times = await test.step("finds times over therapists and sites", () => findTimes(page, person));
  const [first] = times;
  if (!first) throw new Error("No time was found.");
  await test.step("books the best", () => book(page, first, person));
  await test.step("the confirmation carries the calendar file", () => readInvitation(first, person));
  await test.step("sees it in the therapist's week", () => seeWeek(page, first, person));
  const other = times.find((time) => time.site.id !== first.site.id) ?? times.at(-1) ?? first;
  await test.step("moves it", () => move(page, other, person));
  await test.step("cancels it and takes that back", () => cancelAndUndo(page, other, person));
  await test.step("marks a visit of today as arrived", () => markArrived(page, person));
});

test("the same by keyboard alone: find, book, move, cancel, undo", async ({ page }) => {
  test.slow();
  const { keyboard } = page;
  await page.goto("/sign-in");
  await retype(page, page.getByLabel("E-mail address"), "reception@marram.example");
  await retype(page, page.getByLabel("Password"), demoPassword);
  await keyboard.press("Enter");
  await page.waitForURL("**/today");
  const person = await registered(page);

  await expect(async () => {
    await keyboard.press("g");
    await keyboard.press("f");
    await expect(page).toHaveURL(/\/diary\/find$/, { timeout: 5_000 });
  }, "keys work as soon as the page has woken").toPass();
  const patient = page.getByLabel("Patient", { exact: true });
  await retype(page, patient, person.name);
  await expect(page.getByRole("option", { name: new RegExp(person.name) })).toBeVisible();
  await keyboard.press("Enter");
  await expect(patient).toHaveValue(person.name);
  await pick(page, page.getByLabel("For", { exact: true }), "Initial assessment, 45 minutes");
  await pick(page, page.getByLabel("Therapist", { exact: true }), "Nia Prosser");
  const answer = answeredTimes(page);
  await retype(page, page.getByLabel("Not before"), "in 2 weeks");
  const times = await answer;
  const [first] = times;
  const other = times.find((time) => time.startsAt !== first?.startsAt);
  if (!first || !other) throw new Error("Nia Prosser has no two free times.");

  await tabTo(
    page,
    linesOf(page)
      .first()
      .getByRole("button", { name: /^Book / }),
  );
  await keyboard.press("Enter");
  const booking = page.getByRole("dialog", { name: "Book an appointment" });
  await tabTo(page, booking.getByRole("button", { name: `Book ${when(first)}` }));
  await keyboard.press("Enter");
  await expect(cellOf(page, first, person.name, "Booked")).toBeVisible();
  await expect(sheetOf(page).getByRole("heading", { level: 2 })).toBeFocused();

  await keyboard.press("m");
  const moving = page.getByRole("dialog", { name: `Move ${person.name}` });
  await expect(moving.getByLabel("Day", { exact: true })).toBeFocused();
  await retype(page, moving.getByLabel("Day", { exact: true }), shortDate(other.day));
  await retype(page, moving.getByLabel("At", { exact: true }), other.startTime);
  await pick(page, moving.getByLabel("Room", { exact: true }), "Any free room");
  await tabTo(page, moving.getByRole("button", { name: `Move to ${when(other)}` }));
  await keyboard.press("Enter");
  await expect(moving).toBeHidden();
  await expect(cellOf(page, other, person.name, "Booked")).toBeVisible();

  await keyboard.press("x");
  const cancelling = page.getByRole("dialog", { name: `Cancel ${person.name}` });
  await retype(page, cancelling.getByLabel("Why", { exact: true }), "Work");
  await keyboard.press("Enter");
  await expect(cancelling).toBeHidden();
  await expect(sheetOf(page)).toContainText("Cancelled by the patient: Work");

  await keyboard.press("c");
  const changes = page.getByRole("dialog", { name: "Recent changes" });
  await tabTo(page, changes.getByRole("button", { name: /^Undo ?: .*: cancelled$/ }));
  await keyboard.press("Enter");
  await expect(cellOf(page, other, person.name, "Booked")).toBeVisible();
  await keyboard.press("Escape");
  await expect(changes).toBeHidden();
});
