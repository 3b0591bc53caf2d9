import { randomInt, randomUUID } from "node:crypto";
import type { Page } from "@playwright/test";
import type {
  AppointmentView,
  BookingChoicesView,
  FoundTimesView,
  FoundTimeView,
} from "@withy/contracts/diary";
import type { PatientPage, PatientRow } from "@withy/contracts/patients";
import { weekdayDate } from "@withy/core/date-words";
import { addDays, dayOf } from "@withy/core/zoned-time";
import { expect } from "./journey";

export const zone = "Europe/London";

export interface NewPerson {
  readonly givenName: string;
  readonly familyName: string;
  readonly name: string;
  /** As typed at the desk: "14 7 1984". */
  readonly bornText: string;
  readonly bornOn: string;
  readonly phone: string;
  readonly email: string;
}

const syllables = [
  "bra",
  "ca",
  "do",
  "fen",
  "gar",
  "hol",
  "len",
  "mor",
  "net",
  "pel",
  "ros",
  "sal",
  "ter",
  "wen",
];
const letters = (count: number) =>
  Array.from({ length: count }, () => syllables[randomInt(syllables.length)]).join("");
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** A name and an address that no one has yet. */
export function newName() {
  const givenName = capital(letters(2));
  const familyName = capital(letters(5));
  const email = `${familyName.toLowerCase()}.${randomInt(1e9)}@post.example`;
  return { givenName, familyName, name: `${givenName} ${familyName}`, email };
}

/** Someone whom the practice does not know: a name, a birthday and a phone that no one there has. */
export async function someoneNew(page: Page): Promise<NewPerson> {
  const [day, month, year] = [randomInt(1, 29), randomInt(1, 13), randomInt(1940, 2000)];
  const two = (n: number) => String(n).padStart(2, "0");
  return {
    ...newName(),
    bornText: `${day} ${month} ${year}`,
    bornOn: `${year}-${two(month)}-${two(day)}`,
    phone: await phoneOfNoOne(page),
  };
}

/** Landlines: nearly every mobile number that may be invented belongs to a patient of the demonstration. */
async function phoneOfNoOne(page: Page): Promise<string> {
  for (let tries = 0; tries < 40; tries += 1) {
    const phone = `01632960${String(randomInt(1000)).padStart(3, "0")}`;
    const found = await read<PatientPage>(page, `/api/patients?search=${phone}`);
    if (found.rows.length === 0) return phone;
  }
  throw new Error("Every number tried belongs to someone.");
}

/** Reads through the API as the person who is signed in on the page. */
export async function read<T>(page: Page, path: string): Promise<T> {
  const answer = await page.request.get(path);
  expect(answer.status(), path).toBe(200);
  return (await answer.json()) as T;
}

/** Writes through the API, as the screens do. */
export async function write<T>(page: Page, path: string, data: object): Promise<T> {
  const headers = { origin: new URL(page.url()).origin, "idempotency-key": randomUUID() };
  const answer = await page.request.post(path, { data, headers });
  expect(answer.ok(), `${path}: ${await answer.text()}`).toBe(true);
  return (await answer.json()) as T;
}

/** A patient for a journey that is about something else. */
export async function registered(page: Page): Promise<NewPerson & { id: string }> {
  const person = await someoneNew(page);
  const { givenName, familyName, bornOn, phone, email } = person;
  const row = await write<PatientRow>(page, "/api/patients", { givenName, familyName, bornOn, phone, email });
  return { ...person, id: row.id };
}

/** A first visit of someone new in two weeks, booked through the API. */
export async function bookedVisit(page: Page): Promise<AppointmentView> {
  const patient = await registered(page);
  const choices = await read<BookingChoicesView>(page, "/api/diary/choices");
  const serviceId = choices.services.find((service) => service.kind === "initial")?.id ?? "";
  const earliestOn = addDays(dayOf(new Date(), zone), 14);
  const query = new URLSearchParams({ serviceId, patientId: patient.id, earliestOn });
  const { times } = await read<FoundTimesView>(page, `/api/diary/times?${query}`);
  const time = times[0];
  if (!time) throw new Error("No time is free from two weeks ahead on.");
  return write<AppointmentView>(page, "/api/diary/appointments", {
    patientId: patient.id,
    serviceId,
    therapistId: time.therapist.id,
    siteId: time.site.id,
    roomId: time.room.id,
    startsAt: time.startsAt,
  });
}

/** "Tue 8 Dec, 10:15", as the verbs of the dialogs say it. */
export const when = (time: FoundTimeView) => `${weekdayDate(time.day)}, ${time.startTime}`;

/** The name of the visit's cell in the grid of the day, but for its room and state. */
export const cellWords = (time: FoundTimeView, name: string) =>
  `${time.startTime} to ${time.endTime}, ${name}, Initial assessment, `;

/** The times that the search answers with once it knows from which day on. */
export async function answeredTimes(page: Page): Promise<readonly FoundTimeView[]> {
  const answer = await page.waitForResponse(
    (response) => response.url().includes("/api/diary/times") && response.url().includes("earliestOn="),
  );
  return ((await answer.json()) as FoundTimesView).times;
}
