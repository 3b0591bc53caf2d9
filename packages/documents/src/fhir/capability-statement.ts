import type { CapabilityStatement } from "fhir/r4";

const params = (names: Record<string, "date" | "reference" | "token">) =>
  Object.entries(names).map(([name, type]) => ({ name, type }));

const resource = (
  type: "Appointment" | "Schedule" | "Slot",
  names: Record<string, "date" | "reference" | "token">,
) => ({
  type,
  interaction: [{ code: "read" as const }, { code: "search-type" as const }],
  versioning: "no-version" as const,
  searchParam: params(names),
});

const who = { practitioner: "reference", location: "reference" } as const;

/** What the server can do. Nothing here can be written. */
export function capabilityStatement(base: string, at: Date): CapabilityStatement {
  return {
    resourceType: "CapabilityStatement",
    status: "active",
    date: at.toISOString(),
    kind: "instance",
    software: { name: "Withy" },
    implementation: { description: "The diary of one practice, read-only", url: base },
    fhirVersion: "4.0.1",
    format: ["application/fhir+json"],
    rest: [
      {
        mode: "server",
        security: {
          description:
            "Send the practice's key as a bearer token. The owner makes and ends keys under Settings.",
        },
        resource: [
          resource("Appointment", { date: "date", status: "token", ...who }),
          resource("Schedule", { date: "date", ...who }),
          resource("Slot", { date: "date", start: "date", status: "token", schedule: "reference", ...who }),
        ],
      },
    ],
  };
}
