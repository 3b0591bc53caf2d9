import { randomUUID } from "node:crypto";
import type { Page } from "@playwright/test";
import type { DraftedView } from "@withy/contracts/billing";
import type { AppointmentView, BookingChoicesView } from "@withy/contracts/diary";
import { dayOf, instantAt } from "@withy/core/zoned-time";
import { type NewPerson, read, registered, write, zone } from "./desk";
import { expect } from "./journey";

export type Attender = NewPerson & { readonly id: string };

/**
 * A new patient whose first assessment today was attended, whatever the hour and the weekday: it is booked outside
 * the usual hours, for a reason. The person on the page must be one who books.
 */
export async function attendedVisit(page: Page): Promise<Attender> {
  const patient = await registered(page);
  let visit = await bookToday(page, patient.id);
  for (const to of ["arrived", "fulfilled"] as const) {
    const { id, version } = visit;
    visit = await write<AppointmentView>(page, `/api/diary/appointments/${id}/mark`, { version, to });
  }
  expect(visit.state).toBe("fulfilled");
  return patient;
}

async function bookToday(page: Page, patientId: string): Promise<AppointmentView> {
  const { services, therapists } = await read<BookingChoicesView>(page, "/api/diary/choices");
  const service = services.find(({ kind }) => kind === "initial");
  if (!service) throw new Error("The practice gives no first assessment.");
  const able = therapists.filter(({ id }) => service.therapistIds.includes(id));
  for (const startsAt of latestStarts(new Date()))
    for (const { id: therapistId, siteIds } of able)
      for (const siteId of siteIds) {
        const headers = { origin: new URL(page.url()).origin, "idempotency-key": randomUUID() };
        const data = {
          ...{ patientId, serviceId: service.id, therapistId, siteId, startsAt },
          overrideReason: "Seen outside the usual hours",
        };
        const answer = await page.request.post("/api/diary/appointments", { data, headers });
        if (answer.ok()) return (await answer.json()) as AppointmentView;
        // Taken: someone else is there, the next one may be free.
        expect(answer.status(), await answer.text()).toBe(409);
      }
  throw new Error("No one has time left today.");
}

/** Starts that today still holds, the last one first: by then the house is empty. */
function latestStarts(now: Date): string[] {
  const earliest = now.getTime() - 50 * 60_000;
  const starts: string[] = [];
  let at = instantAt(dayOf(now, zone), "23:10", zone)?.getTime() ?? earliest;
  for (; at >= earliest; at -= 45 * 60_000) starts.push(new Date(at).toISOString());
  return starts;
}

/** Puts one patient's attended visit on a draft, for a journey that begins there. The address of the draft. */
export async function draftFor(page: Page, patient: Attender): Promise<string> {
  const drafted = await write<DraftedView>(page, "/api/billing/drafts", {
    patientId: patient.id,
  });
  expect(drafted.invoiceIds).toHaveLength(1);
  return `/billing/invoices/${drafted.invoiceIds[0]}`;
}
