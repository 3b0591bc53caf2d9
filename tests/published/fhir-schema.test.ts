import { expect, it } from "vitest";
import { fhirFaults } from "../support/fhir-schema";

// Examples of what HL7's R4 schema lets pass and what it stops: a schema that lets everything pass proves nothing.
const booked = {
  resourceType: "Appointment",
  status: "booked",
  start: "2026-12-01T09:00:00Z",
  end: "2026-12-01T09:30:00+00:00",
  participant: [{ actor: { reference: "Patient/1" }, status: "accepted" }],
};
const { participant, ...alone } = booked;

it("lets a booked appointment pass", () => expect(fhirFaults(booked)).toEqual([]));

it.each([
  ["an appointment without participants", alone],
  ["a start without a zone", { ...booked, start: "2026-12-01T09:00:00" }],
  ["a start with a space", { ...booked, start: "2026-12-01 09:00" }],
  ["a property that FHIR does not know", { ...booked, foo: 1 }],
  [
    "a slot that is booked",
    { resourceType: "Slot", schedule: {}, status: "booked", start: booked.start, end: booked.end },
  ],
])("stops %s", (_, resource) => expect(fhirFaults(resource)).not.toEqual([]));
