import { apiTable, areas } from "./api-table";
import { describeOperation, openPath } from "./describe-operation";
import { handRoutes } from "./hand-routes";

type Json = Record<string, unknown>;

const said: Readonly<Record<string, string>> = {
  unauthenticated: "Nobody is signed in, or the session has ended.",
  forbidden: "The role does not allow it, or the request came from another site.",
  "not-found": "There is no such thing in this practice.",
  refused: "A rule says no; kind says which, and detail what to do.",
  stale: "Someone else changed it meanwhile; more holds their version where it helps.",
  invalid: "Some of what was sent needs another look; fields says what.",
  unavailable: "Something went wrong on our side and nothing was changed.",
};

const words = { type: "string" };

/** RFC 9457 problem details with our own members. */
const problemSchema: Json = {
  type: "object",
  required: ["type", "title", "status", "detail", "code", "kind", "fields", "requestId", "more"],
  properties: {
    type: words,
    title: words,
    status: { type: "integer" },
    detail: { ...words, description: "A sentence for a person, which says what to do." },
    code: { enum: Object.keys(said) },
    kind: { ...words, description: "The refusal's name for programs, such as slot-taken." },
    fields: {
      type: "array",
      items: {
        type: "object",
        required: ["field", "message"],
        properties: { field: words, message: words },
      },
    },
    requestId: words,
    more: { type: "object" },
  },
};

const problemResponses = (): Json =>
  Object.fromEntries(
    Object.entries(said).map(([code, description]) => [
      code,
      {
        description,
        content: { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } },
      },
    ]),
  );

/** Which area and name a verb has: a route's line holds the verb itself. */
const namesOfVerbs = (): Map<unknown, { area: string; name: string }> =>
  new Map(
    Object.entries(areas).flatMap(([area, given]) =>
      Object.entries(given).map(([name, value]) => [value, { area, name }] as const),
    ),
  );

function paths(): Record<string, Json> {
  const names = namesOfVerbs();
  const all: Record<string, Json> = {};
  const add = (line: string, operation: Json) => {
    const [method = "", address = ""] = line.split(" ");
    const path = openPath(address);
    all[path] = { ...all[path], [method.toLowerCase()]: operation };
  };
  for (const [line, verb] of Object.entries(apiTable)) {
    const named = names.get(verb);
    if (!named) throw new Error(`The verb of ${line} is given out by no area.`);
    const [method = "", address = ""] = line.split(" ");
    add(line, describeOperation({ method, address, ...named, verb }));
  }
  for (const [line, operation] of Object.entries(handRoutes)) add(line, operation);
  return all;
}

/** The whole API as an OpenAPI 3.1 document, made of the contracts that the verbs themselves parse with. */
export function openApiDocument(): Json {
  return {
    openapi: "3.1.0",
    info: {
      title: "Withy",
      version: "1",
      description:
        "Everything the screens of Withy do. Instants are ISO 8601 in UTC, money is whole pence. Writes must come from Withy's own pages; other programs read the diary through /api/fhir/r4 with a key.",
    },
    tags: Object.keys(areas).map((name) => ({ name })),
    security: [{ session: [] }],
    paths: paths(),
    components: {
      schemas: { Problem: problemSchema },
      responses: problemResponses(),
      securitySchemes: {
        session: { type: "apiKey", in: "cookie", name: "next-auth.session-token" },
        key: { type: "http", scheme: "bearer", description: "A key that the owner makes under Settings." },
      },
    },
  };
}
