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

const fhir = (description: string): Json => ({
  description,
  content: { "application/fhir+json": { schema: { type: "object" } } },
});

const fhirType = {
  name: "type",
  in: "path",
  required: true,
  schema: { enum: ["Appointment", "Slot", "Schedule"] },
};

const fhirRefusals: Json = {
  "401": fhir("No key, a wrong one or one that was ended: an OperationOutcome."),
  "404": fhir("No such resource in this practice: an OperationOutcome."),
  "429": fhir("Asked too often: an OperationOutcome, and Retry-After."),
};

const query = (name: string, description: string): Json => ({
  name,
  in: "query",
  description,
  schema: { type: "string" },
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
  "GET /api/fhir/r4/metadata": {
    tags: ["diary"],
    summary: "What the FHIR R4 server can do",
    security: [],
    responses: { "200": fhir("A CapabilityStatement.") },
  },
  "GET /api/fhir/r4/[type]": {
    tags: ["diary"],
    summary: "Searches the diary by FHIR R4",
    description:
      "For programs with a key that the owner makes under Settings. Patients stand with initials only.",
    security: [{ key: [] }],
    parameters: [
      fhirType,
      query("date", "A date or an instant, with eq, ge, gt, le or lt before it; may come twice."),
      query("start", "The same for a Slot."),
      query("practitioner", "Practitioner/ and an id; several with commas."),
      query("location", "Location/ and an id; several with commas."),
      query("schedule", "Schedule/ and an id, for Slot."),
      query("status", "Codes of FHIR R4, several with commas; not for Schedule."),
      query("_count", "How many at most, 1 to 200; 50 where left out."),
      query("_after", "Where the page before ended, as its next link says."),
      query("_format", "json."),
    ],
    responses: {
      "200": fhir("A Bundle of type searchset, with links to itself and to the next page."),
      "400": fhir("What cannot be asked, and what to send instead: an OperationOutcome."),
      ...fhirRefusals,
    },
  },
  "GET /api/fhir/r4/[type]/[id]": {
    tags: ["diary"],
    summary: "One Appointment, Slot or Schedule",
    security: [{ key: [] }],
    parameters: [fhirType, inPath("id", "The resource's id, as a search gave it.")],
    responses: { "200": fhir("The resource."), ...fhirRefusals },
  },
  "GET /api/openapi.json": {
    tags: ["practices"],
    summary: "This document",
    security: [],
    responses: { "200": json("An OpenAPI 3.1 document.") },
  },
};
