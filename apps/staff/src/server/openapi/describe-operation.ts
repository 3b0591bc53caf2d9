import type { Verb } from "@withy/services/verb";
import { z } from "zod";

type Json = Record<string, unknown>;
interface ObjectSchema extends Json {
  properties?: Record<string, Json>;
  required?: string[];
}

const problems: Readonly<Record<string, string>> = {
  "401": "unauthenticated",
  "403": "forbidden",
  "404": "not-found",
  "409": "refused",
  "412": "stale",
  "422": "invalid",
  "500": "unavailable",
};

/** What a caller sends: instants and numbers of a query as text, before the contract reads them. */
function inputSchema(input: z.ZodType): ObjectSchema {
  const { $schema, ...schema } = z.toJSONSchema(input, {
    io: "input",
    unrepresentable: "any",
  }) as ObjectSchema;
  return schema;
}

/** "/api/diary/appointments/[appointmentId]" names these. */
export const pathParameters = (address: string): string[] =>
  [...address.matchAll(/\[(?:\.\.\.)?(\w+)\]/g)].map((match) => match[1] ?? "");

/** The same address as OpenAPI writes it. */
export const openPath = (address: string): string => address.replace(/\[(?:\.\.\.)?(\w+)\]/g, "{$1}");

function parameters(method: string, inPath: readonly string[], schema: ObjectSchema): Json[] {
  const properties = schema.properties ?? {};
  const fromPath = inPath.map((name) => ({
    name,
    in: "path",
    required: true,
    schema: properties[name] ?? { type: "string" },
  }));
  if (method !== "GET") {
    const key = { type: "string", pattern: "^[\\w-]{8,64}$" };
    const description = "The same key with the same write does it once and gives the first answer again.";
    return [...fromPath, { name: "idempotency-key", in: "header", description, schema: key }];
  }
  const fromQuery = Object.entries(properties)
    .filter(([name]) => !inPath.includes(name))
    .map(([name, of]) => ({
      name,
      in: "query",
      required: schema.required?.includes(name) ?? false,
      schema: of,
    }));
  return [...fromPath, ...fromQuery];
}

/** What is left of the input for the body: the path's parameters win over it, so they are not asked twice. */
function body(inPath: readonly string[], schema: ObjectSchema): Json | null {
  const properties = Object.entries(schema.properties ?? {}).filter(([name]) => !inPath.includes(name));
  if (schema.properties !== undefined && properties.length === 0) return null;
  const required = schema.required?.filter((name) => !inPath.includes(name)) ?? [];
  const rest =
    schema.properties === undefined
      ? schema
      : { ...schema, properties: Object.fromEntries(properties), required };
  return { required: required.length > 0, content: { "application/json": { schema: rest } } };
}

export interface RouteOfVerb {
  readonly method: string;
  readonly address: string;
  readonly area: string;
  readonly name: string;
  readonly verb: Pick<Verb, "permission" | "input">;
}

/** "bookAppointment" as "Book appointment". */
const summaryOf = (name: string): string => {
  const words = name.replace(/([A-Z])/g, " $1").toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
};

/** One route as an OpenAPI operation: what to send, who may, and every way in which it can refuse. */
export function describeOperation({ method, address, area, name, verb }: RouteOfVerb): Json {
  const schema = inputSchema(verb.input);
  const inPath = pathParameters(address);
  const requestBody = method === "GET" ? null : body(inPath, schema);
  const refusals = Object.entries(problems).filter(([status]) => method !== "GET" || status !== "412");
  return {
    operationId: `${area}.${name}`,
    tags: [area],
    summary: summaryOf(name),
    description: `Needs the permission ${verb.permission}.`,
    "x-permission": verb.permission,
    parameters: parameters(method, inPath, schema),
    ...(requestBody === null ? {} : { requestBody }),
    responses: {
      "2XX": { description: "What was asked for, or what has come of it. Files come as what they are." },
      ...Object.fromEntries(
        refusals.map(([status, code]) => [status, { $ref: `#/components/responses/${code}` }]),
      ),
    },
  };
}
