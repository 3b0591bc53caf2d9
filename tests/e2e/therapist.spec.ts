import type { NoteView } from "@withy/contracts/clinical";
import type { LetterView } from "@withy/contracts/letters";
import type { PatientPage } from "@withy/contracts/patients";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { expectAccessible } from "./support/accessible";
import { read } from "./support/desk";
import { demoPassword, expect, signIn, test } from "./support/journey";
import { retype, tabTo } from "./support/keyboard";
import {
  draftFromEpisode,
  editSentence,
  readAsDoctor,
  seeDischarged,
  signAndSend,
} from "./support/therapist-letter";
import {
  addAddendum,
  fieldOf,
  openEpisodeFromVisit,
  recordMeasures,
  signForGood,
  writeWithAutosave,
} from "./support/therapist-note";
import { buildToTwentyMinutes, giveAndPrint, startProgramme } from "./support/therapist-programme";
import {
  arrivedToday,
  assessment,
  begunNote,
  done,
  openedEpisode,
  registeredWithGp,
  send,
  signedByApi,
} from "./support/treatment";

test("the therapist's day: episode, note, measures, programme, signature, letter and discharge", async ({
  page,
}) => {
  await signIn(page, "therapist");
  const patient = await registeredWithGp(page);
  await arrivedToday(page, patient);

  await test.step("opens an episode from the visit of today and begins the note", () =>
    openEpisodeFromVisit(page, patient));
  const noteId = page.url().slice(-36);
  await test.step("writes under headings, and finds it again after a reload", () => writeWithAutosave(page));
  await test.step("records three measures, scored by their rules", () => recordMeasures(page));

  await test.step("reads a change over several visits in words", async () => {
    const found = await read<PatientPage>(page, "/api/patients?search=Eleri+Tamworth");
    await page.goto(`/patients/${found.rows[0]?.id}/measures`);
    const courseOf = (name: string) =>
      page
        .getByRole("main")
        .locator("section")
        .filter({ has: page.getByRole("heading", { name }) });
    await expect(courseOf("30-second chair stand")).toContainText(/Since \d.*: Better by [34]\./);
    await expect(courseOf("Pain rating, 0 to 10")).toContainText(
      /Better by [23], beyond measurement error \(1\.77\)\./,
    );
  });

  await test.step("starts a programme", () => startProgramme(page, patient));
  await test.step("adds exercises until the clock says 20:00, and makes one easier", () =>
    buildToTwentyMinutes(page));
  await test.step("gives it out and prints it", () => giveAndPrint(page, patient));

  await test.step("signs the note, which nobody can change then", () => signForGood(page, noteId, patient));
  await test.step("adds an addendum with its reason", () => addAddendum(page));

  const note = await read<NoteView>(page, `/api/clinical/notes/${noteId}`);
  const letterId = await test.step("begins the discharge letter from the episode", () =>
    draftFromEpisode(page, patient, note.episode.id));
  await test.step("puts a sentence into other words", () => editSentence(page, patient));
  await test.step("signs it, discharges and sends it to the GP", () => signAndSend(page, patient));
  await test.step("the GP's mail leads to the letter by a private link", () =>
    readAsDoctor(page, letterId, patient));
  await test.step("the episode is discharged", () => seeDischarged(page, patient, note.episode.id));
});

test("a note begun, written and signed by keyboard alone", async ({ page }) => {
  const { keyboard } = page;
  await page.goto("/sign-in");
  await retype(page, page.getByLabel("E-mail address"), "therapist@marram.example");
  await retype(page, page.getByLabel("Password"), demoPassword);
  await keyboard.press("Enter");
  await page.waitForURL("**/notes");
  const patient = await registeredWithGp(page);
  const visit = await arrivedToday(page, patient);
  await openedEpisode(page, visit);

  await page.goto(`/notes?visit=${visit.id}`);
  const begin = page.getByRole("button", { name: `Write the note of ${patient.name}` });
  await expect(begin, "the visit that was asked for is at hand").toBeFocused({ timeout: 60_000 });
  await keyboard.press("Enter");
  await page.waitForURL(/\/notes\/[0-9a-f-]{36}$/, { timeout: 60_000 });
  for (const [heading, , text] of assessment) {
    const field = fieldOf(page, heading);
    await tabTo(page, field);
    await keyboard.type(text);
    await expect(field).toHaveValue(text);
  }
  await keyboard.press("Control+Enter");
  const dialog = page.getByRole("dialog", { name: `Sign the note of ${patient.name}` });
  await tabTo(page, dialog.getByRole("button", { name: "Sign for good" }));
  await keyboard.press("Enter");
  await expect(page.getByText("Signed by Nia Prosser, PH100202")).toBeVisible({ timeout: 30_000 });
  await expect(page.getByRole("textbox")).toHaveCount(0);
  const written = page.getByRole("region", { name: "Initial assessment" });
  for (const [, , text] of assessment) await expect(written).toContainText(text);
});

test("the pages of treatment hold to axe, in light and in dark", async ({ page }) => {
  await signIn(page, "therapist");
  const { patient, note } = await begunNote(page);
  const look = async (address: string, sight: string | RegExp) => {
    await page.goto(address);
    await expect(page.getByText(sight).first()).toBeVisible({ timeout: 60_000 });
    await expectAccessible(page);
  };
  await test.step("a note that is written", () => look(`/notes/${note.id}`, /^Saved \d\d:\d\d$/));
  await test.step("a signed note", async () => {
    await signedByApi(page, note);
    await look(`/notes/${note.id}`, "Signed by Nia Prosser, PH100202");
  });
  await test.step("a programme that is built", async () => {
    const programme = await done<ProgrammeView>(
      send(page, "POST", "/api/clinical/programmes", { episodeId: note.episode.id }),
    );
    await page.goto(`/exercises/programmes/${programme.id}`);
    await buildToTwentyMinutes(page);
    await expectAccessible(page);
  });
  await test.step("an exercise", () => look("/exercises/sit-to-stand", "Ladder, easiest first"));
  const letter = await done<LetterView>(send(page, "POST", "/api/letters", { episodeId: note.episode.id }));
  await test.step("a letter that is written", () => look(`/letters/${letter.id}`, "Before you sign"));
  await test.step("a signed letter", async () => {
    const discharge = { version: letter.episode.version, outcome: "goals-met" };
    await done(send(page, "POST", `/api/letters/${letter.id}/sign`, { version: letter.version, discharge }));
    await look(`/letters/${letter.id}`, patient.gp.name);
  });
});
