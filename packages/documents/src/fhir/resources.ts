import { initialsOf } from "@withy/core/names";
import { type AppointmentState, stateFacts } from "@withy/diary/appointment-states";
import type { Appointment, Bundle, FhirResource, OperationOutcome, Schedule, Slot } from "fhir/r4";
import { type ScheduleKey, type SlotKey, scheduleId, slotId } from "./schedule-id";

export interface AppointmentFacts {
  readonly id: string;
  readonly version: number;
  readonly state: AppointmentState;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly createdAt: Date;
  readonly updatedAt: Date;
  readonly cancelledBy: "patient" | "clinic" | null;
  readonly patientId: string;
  readonly givenName: string;
  readonly familyName: string;
  readonly therapistId: string;
  readonly therapistName: string;
  readonly siteId: string;
  readonly siteName: string;
}

const cancellation = "http://terminology.hl7.org/CodeSystem/appointment-cancellation-reason";

const cancelationReason = (by: "patient" | "clinic" | null) =>
  by === null
    ? {}
    : { cancelationReason: { coding: [{ system: cancellation, code: by === "patient" ? "pat" : "prov" }] } };

/**
 * A visit as an Appointment. The patient stands as a reference with initials; neither service nor room nor note is
 * told, since they can say what the visit is for.
 */
export function appointmentResource(facts: AppointmentFacts): Appointment {
  const { state, startsAt, endsAt } = facts;
  const agreed = state === "cancelled" ? "declined" : "accepted";
  return {
    resourceType: "Appointment",
    id: facts.id,
    meta: { versionId: String(facts.version), lastUpdated: facts.updatedAt.toISOString() },
    status: stateFacts[state].fhir,
    ...(state === "cancelled" ? cancelationReason(facts.cancelledBy) : {}),
    start: startsAt.toISOString(),
    end: endsAt.toISOString(),
    minutesDuration: (endsAt.getTime() - startsAt.getTime()) / 60_000,
    created: facts.createdAt.toISOString(),
    participant: [
      {
        actor: {
          reference: `Patient/${facts.patientId}`,
          display: initialsOf(facts.givenName, facts.familyName),
        },
        status: state === "booked" ? "needs-action" : agreed,
      },
      {
        actor: { reference: `Practitioner/${facts.therapistId}`, display: facts.therapistName },
        status: agreed,
      },
      { actor: { reference: `Location/${facts.siteId}`, display: facts.siteName }, status: agreed },
    ],
  };
}

export interface ScheduleFacts extends ScheduleKey {
  readonly therapistName: string;
  readonly siteName: string;
  readonly from: Date;
  /** Null where the working pattern has no end. */
  readonly to: Date | null;
}

/** A therapist's working time at one site. */
export function scheduleResource(facts: ScheduleFacts): Schedule {
  return {
    resourceType: "Schedule",
    id: scheduleId(facts),
    active: true,
    actor: [
      { reference: `Practitioner/${facts.therapistId}`, display: facts.therapistName },
      { reference: `Location/${facts.siteId}`, display: facts.siteName },
    ],
    planningHorizon: {
      start: facts.from.toISOString(),
      ...(facts.to === null ? {} : { end: facts.to.toISOString() }),
    },
  };
}

/** A stretch of a Schedule that is free, taken or away. It never says by whom it is taken. */
export function slotResource(slot: SlotKey): Slot {
  return {
    resourceType: "Slot",
    id: slotId(slot),
    schedule: { reference: `Schedule/${scheduleId(slot)}` },
    status: slot.status,
    start: new Date(slot.from).toISOString(),
    end: new Date(slot.to).toISOString(),
  };
}

export interface FoundPage {
  /** The address of the server, without a slash at its end. */
  readonly base: string;
  readonly self: string;
  readonly next: string | null;
  readonly resources: readonly (Appointment | Schedule | Slot)[];
}

export function searchBundle({ base, self, next, resources }: FoundPage): Bundle {
  return {
    resourceType: "Bundle",
    type: "searchset",
    link: [{ relation: "self", url: self }, ...(next === null ? [] : [{ relation: "next", url: next }])],
    // An empty array is not allowed in FHIR's JSON: what is absent stays out.
    ...(resources.length === 0
      ? {}
      : {
          entry: resources.map((resource) => ({
            fullUrl: `${base}/${resource.resourceType}/${resource.id}`,
            resource: resource as FhirResource,
            search: { mode: "match" as const },
          })),
        }),
  };
}

export type IssueCode = OperationOutcome["issue"][number]["code"];

export function operationOutcome(code: IssueCode, diagnostics: string): OperationOutcome {
  return { resourceType: "OperationOutcome", issue: [{ severity: "error", code, diagnostics }] };
}
