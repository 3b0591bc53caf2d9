import { randomInt, randomUUID } from "node:crypto";
import type { APIResponse, Page } from "@playwright/test";
import type { EpisodeView, NoteView } from "@withy/contracts/clinical";
import type { AppointmentView, BookingChoicesView } from "@withy/contracts/diary";
import type { GpPracticeView, PatientRow } from "@withy/contracts/patients";
import { dayOf, instantAt } from "@withy/core/zoned-time";
import { read, zone } from "./desk";
import { expect } from "./journey";

export interface Treated {
  readonly id: string;
  readonly givenName: string;
  readonly familyName: string;
  readonly name: string;
  /** As the reader of a letter types it: day, month, year. */
  readonly bornOn: string;
  readonly gp: { readonly name: string; readonly email: string };
}

/** Writes through the API as the person who is signed in on the page; the answer may be a refusal. */
export function send(page: Page, method: "POST" | "PUT", path: string, data: object): Promise<APIResponse> {
  const headers = { origin: new URL(page.url()).origin, "idempotency-key": randomUUID() };
  return page.request.fetch(path, { method, data, headers });
}

export async function done<T>(answer: Promise<APIResponse>): Promise<T> {
  const got = await answer;
  expect(got.ok(), `${got.url()}: ${await got.text()}`).toBe(true);
  return (await got.json()) as T;
}

/** Someone new whose doctor has an e-mail address. */
export async function registeredWithGp(page: Page): Promise<Treated> {
  const surgeries = await read<readonly GpPracticeView[]>(page, "/api/patients/gp-practices");
  const surgery = surgeries.find((one) => one.email !== null);
  if (!surgery?.email) throw new Error("No surgery has an e-mail address.");
  const [givenName, familyName] = [nameOf(2), nameOf(5)];
  const gpName = "Dr Ines Oake";
  const row = await done<PatientRow>(
    send(page, "POST", "/api/patients", {
      ...{ givenName, familyName, gpName, gpPracticeId: surgery.id, bornOn: "1971-05-19" },
      ...{ phone: "07700 900519", email: `${familyName.toLowerCase()}@post.example`, isSomeoneElse: true },
    }),
  );
  const gp = { name: gpName, email: surgery.email };
  const name = `${givenName} ${familyName}`;
  return { id: row.id, givenName, familyName, name, bornOn: "19 5 1971", gp };
}

const syllables = [
  "bel",
  "cor",
  "dun",
  "fal",
  "gwy",
  "hes",
  "lin",
  "mar",
  "nor",
  "pen",
  "ruth",
  "sten",
  "tam",
];

function nameOf(count: number): string {
  const text = Array.from({ length: count }, () => syllables[randomInt(syllables.length)]).join("");
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/**
 * A start of today on the five minutes: in the evening, when her diary is free, or within the last hour where that
 * is later. A note may be written for any visit of its day.
 */
function someStart(): Date {
  const now = new Date();
  const today = dayOf(now, zone);
  const evening = instantAt(today, "18:00", zone)?.getTime() ?? 0;
  const midnight = instantAt(today, "23:50", zone)?.getTime() ?? 0;
  const step = 5 * 60_000;
  const from = Math.max(evening, Math.ceil((now.getTime() - 50 * 60_000) / step) * step);
  return new Date(from + randomInt(Math.max(1, Math.floor((midnight - from) / step))) * step);
}

/** A visit of today in Nia Prosser's diary whose patient has come, at whatever hour and weekday this runs. */
export async function arrivedToday(page: Page, patient: Treated): Promise<AppointmentView> {
  const choices = await read<BookingChoicesView>(page, "/api/diary/choices");
  const site = choices.sites.find(({ name }) => name === "Saltgate");
  const therapist = choices.therapists.find(({ name }) => name === "Nia Prosser");
  const service = choices.services.find(({ kind }) => kind === "initial");
  const ids = {
    patientId: patient.id,
    siteId: site?.id,
    therapistId: therapist?.id,
    serviceId: service?.id,
  };
  let said = "";
  for (let tries = 0; tries < 30; tries += 1) {
    const startsAt = someStart().toISOString();
    const input = { ...ids, startsAt, durationMinutes: 15, overrideReason: "Came without an appointment" };
    const answer = await send(page, "POST", "/api/diary/appointments", input);
    if (answer.ok()) return arrive(page, (await answer.json()) as AppointmentView);
    said = await answer.text();
  }
  throw new Error(`No start of today is free: ${said}`);
}

function arrive(page: Page, { id, version }: AppointmentView): Promise<AppointmentView> {
  return done(send(page, "POST", `/api/diary/appointments/${id}/mark`, { version, to: "arrived" }));
}

/** An episode of a left knee that the visit belongs to, its note not begun. */
export function openedEpisode(page: Page, visit: AppointmentView): Promise<EpisodeView> {
  return done(
    send(page, "POST", "/api/clinical/episodes", {
      patientId: visit.patient.id,
      siteId: visit.site.id,
      appointmentId: visit.id,
      problem: "Pain behind the kneecap",
      region: "knee",
      side: "left",
      referralSource: "self",
      referredBy: "",
      reason: "",
      goals: ["Take the stairs without the rail"],
      plannedVisits: 6,
    }),
  );
}

/** The note of a visit of today, begun and without words. */
export async function begunNote(page: Page): Promise<{ patient: Treated; note: NoteView }> {
  const patient = await registeredWithGp(page);
  const visit = await arrivedToday(page, patient);
  await openedEpisode(page, visit);
  const note = await done<NoteView>(send(page, "POST", "/api/clinical/notes", { appointmentId: visit.id }));
  return { patient, note };
}

/** A first assessment as a therapist writes it, by the words over each field. */
export const assessment: readonly (readonly [heading: string, key: string, text: string])[] = [
  ["History", "history", "Ache behind the left kneecap for four months, worse on stairs and after sitting."],
  ["What it stops", "impact", "Walks down one step at a time. Wants the stairs at the boathouse back."],
  ["General health", "background", "Well, no medicines. No allergies known."],
  ["Examination", "examination", "Left knee full range, no swelling. Step down sore at 20 cm."],
  ["Assessment", "assessment", "Kneecap pain on loading. Nothing today points to a more serious cause."],
  ["Consent", "consent", "Explained the findings and the choices; agreed to strength work."],
  ["Treatment given", "treatment", "Step down at 10 cm practised, hand near the rail."],
  ["Plan", "plan", "Programme on three days a week. Seen again in ten days."],
];

export const assessmentBody = Object.fromEntries(assessment.map(([, key, text]) => [key, text]));

/** Signs the note through the API, with every heading written. */
export async function signedByApi(page: Page, note: NoteView): Promise<void> {
  const at = `/api/clinical/notes/${note.id}`;
  const saved = await done<{ version: number }>(
    send(page, "PUT", `${at}/draft`, { version: note.version, body: assessmentBody }),
  );
  await done(send(page, "POST", `${at}/sign`, { version: saved.version }));
}

/** The bytes behind an address are a PDF. */
export async function expectPdf(page: Page, address: string): Promise<void> {
  const answer = await page.request.get(address);
  expect(answer.status(), address).toBe(200);
  expect(answer.headers()["content-type"]).toBe("application/pdf");
  expect((await answer.body()).subarray(0, 5).toString("latin1")).toBe("%PDF-");
}

/** Presses again until it has an effect: a page that has just come may not have woken yet. */
export async function pressUntil(press: () => Promise<void>, effect: () => Promise<void>): Promise<void> {
  await expect(async () => {
    await press();
    await effect();
  }).toPass({ timeout: 60_000 });
}
