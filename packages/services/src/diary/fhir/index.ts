import { AppError } from "@withy/core/errors";
import { searchBundle } from "@withy/documents/fhir/resources";
import type { KeyContext } from "./open-by-key";
import { type Askable, type FhirQuery, readQuery } from "./read-query";
import { readAppointmentResource, searchAppointments } from "./search-appointments";
import { readScheduleResource, searchSchedules } from "./search-schedules";
import { readSlotResource, searchSlots } from "./search-slots";

export { capabilityStatement } from "@withy/documents/fhir/capability-statement";
export { type IssueCode, operationOutcome } from "@withy/documents/fhir/resources";
export { type KeyContext, openByKey } from "./open-by-key";

/** Codes of HL7 FHIR R4; those that this diary never has find nothing. */
const appointmentStatuses = [
  ...["proposed", "pending", "booked", "arrived", "fulfilled", "cancelled", "noshow"],
  ...["entered-in-error", "checked-in", "waitlist"],
];
const slotStatuses = ["busy", "free", "busy-unavailable", "busy-tentative", "entered-in-error"];

interface Kind {
  readonly askable: Askable;
  readonly search: (
    ctx: KeyContext,
    q: FhirQuery,
  ) => Promise<{ resources: Parameters<typeof searchBundle>[0]["resources"]; after: string | null }>;
  readonly read: (
    ctx: KeyContext,
    id: string,
  ) => Promise<Parameters<typeof searchBundle>[0]["resources"][number] | null>;
}

const kinds: ReadonlyMap<string, Kind> = new Map<string, Kind>([
  [
    "Appointment",
    {
      askable: { dates: ["date"], statuses: appointmentStatuses },
      search: searchAppointments,
      read: readAppointmentResource,
    },
  ],
  [
    "Schedule",
    { askable: { dates: ["date"], statuses: null }, search: searchSchedules, read: readScheduleResource },
  ],
  [
    "Slot",
    {
      askable: { dates: ["date", "start"], statuses: slotStatuses, canNameSchedule: true },
      search: searchSlots,
      read: readSlotResource,
    },
  ],
]);

function kindOf(type: string): Kind {
  const kind = kinds.get(type);
  if (!kind)
    throw new AppError("not-found", "Only Appointment, Slot and Schedule can be read here.", {
      kind: "not-supported",
    });
  return kind;
}

/** Answers a search as a Bundle with links to itself and to the next page. */
export async function searchFhir(ctx: KeyContext, base: string, type: string, params: URLSearchParams) {
  const { askable, search } = kindOf(type);
  const { resources, after } = await search(ctx, readQuery(params, ctx.zone, askable));
  const addressOf = (more: URLSearchParams) =>
    `${base}/${type}${more.size === 0 ? "" : `?${more.toString()}`}`;
  const onward = new URLSearchParams(params);
  if (after !== null) onward.set("_after", after);
  return searchBundle({
    base,
    self: addressOf(params),
    next: after === null ? null : addressOf(onward),
    resources,
  });
}

/** One resource by its id. A foreign one, a missing one and an id that is none answer the same. */
export async function readFhir(ctx: KeyContext, type: string, id: string) {
  const found = await kindOf(type).read(ctx, id);
  if (!found) throw new AppError("not-found", `There is no ${type} with this id.`);
  return found;
}
