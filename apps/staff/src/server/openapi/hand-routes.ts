type Json = Record<string, unknown>;

const text = (description: string): Json => ({
  description,
  content: { "text/plain": { schema: { type: "string" } } },
});
const json = (description: string): Json => ({
  description,
  content: { "application/json": { schema: { type: "object" } } },
});
const problem = (name: string): Json => ({ $ref: `#/components/responses/${name}` });
const inPath = (name: string, description: string): Json => ({
  name,
  in: "path",
  required: true,
  description,
  schema: { type: "string" },
});

const signIn = (summary: string): Json => ({
  tags: ["practices"],
  summary,
  parameters: [inPath("nextauth", "Which of the sign-in library's own steps.")],
  security: [],
  responses: { "2XX": json("The library's own answer."), "3XX": { description: "The next step." } },
});

/** Routes that are no single verb: each is told by hand, and says why it asks for no session. */
export const handRoutes: Readonly<Record<string, Json>> = {
  "GET /api/auth/[...nextauth]": signIn("Reads of the sign-in library"),
  "POST /api/auth/[...nextauth]": signIn("Steps of the sign-in library"),
  "GET /api/health": {
    tags: ["messaging"],
    summary: "Whether app, database and worker are well",
    description: "Asked by machines, without a session.",
    security: [],
    responses: { "200": json("All three are well."), "503": json("One of them is not, and which.") },
  },
  "POST /api/billing/card-events": {
    tags: ["billing"],
    summary: "Takes an event of the card service",
    description: "No session: the signature over the raw body is the only proof.",
    security: [],
    parameters: [{ name: "stripe-signature", in: "header", required: true, schema: { type: "string" } }],
    requestBody: { required: true, content: { "application/json": { schema: { type: "object" } } } },
    responses: {
      "200": json("Received."),
      "409": problem("refused"),
      "413": { description: "The event is larger than any of theirs." },
    },
  },
  "GET /api/feeds/[file]": {
    tags: ["diary"],
    summary: "A therapist's calendar by its secret address",
    description: "For calendar programs, without a session: 30 days back, 180 days ahead, initials only.",
    security: [],
    parameters: [
      inPath("file", "The secret of the address with .ics behind it."),
      { name: "if-none-match", in: "header", schema: { type: "string" } },
    ],
    responses: {
      "200": { description: "The calendar.", content: { "text/calendar": { schema: { type: "string" } } } },
      "304": { description: "Nothing has changed since the version that was named." },
      "404": problem("not-found"),
      "429": text("Asked too often. Retry-After says when to ask again."),
    },
  },
  "GET /api/openapi.json": {
    tags: ["practices"],
    summary: "This document",
    security: [],
    responses: { "200": json("An OpenAPI 3.1 document.") },
  },
};
