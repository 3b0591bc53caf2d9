import type { WaitingFilters } from "./waiting-client";

/** The list's address with its filters. */
export function waitingHref({ siteId, urgency, page }: WaitingFilters): string {
  const query = new URLSearchParams();
  if (siteId !== undefined) query.set("site", siteId);
  if (urgency !== undefined) query.set("urgency", urgency);
  if (page > 1) query.set("page", String(page));
  const text = query.toString();
  return text === "" ? "/diary/waiting" : `/diary/waiting?${text}`;
}

/** Where a time is offered to whom it suits. */
export function offerHref(time: {
  siteId: string;
  therapistId: string;
  startsAt: string;
  freedById?: string;
}): string {
  const { siteId, therapistId, startsAt, freedById } = time;
  const query = new URLSearchParams({ site: siteId, therapist: therapistId, at: startsAt });
  if (freedById !== undefined) query.set("freed", freedById);
  return `/diary/waiting/offer?${query}`;
}

/** Opens the form for someone, with what is known already. */
export function addHref(known: { patientId: string | null; serviceId?: string }): string {
  const query = new URLSearchParams({ add: "1" });
  if (known.patientId) query.set("patient", known.patientId);
  if (known.serviceId) query.set("service", known.serviceId);
  return `/diary/waiting?${query}`;
}
