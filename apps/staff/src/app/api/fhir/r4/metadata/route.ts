import { systemClock } from "@withy/core/clock";
import { capabilityStatement } from "@withy/services/diary/fhir/index";
import { fhirBase, fhirJson } from "@/server/fhir-route";

/** What the server can do; asked before a key is at hand. */
export function GET() {
  return fhirJson(capabilityStatement(fhirBase(), systemClock.now()));
}
