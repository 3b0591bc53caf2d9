import { expect, test } from "vitest";
import { verbs } from "../support/verbs";
import { readRoutes } from "./support/routes";

const routes = readRoutes();
const known = new Map(verbs.map((one) => [one.name, one]));

/** Handlers that cannot be one verb, each with its reason. */
const byHand: Readonly<Record<string, string>> = {
  "GET /api/auth/[...nextauth]": "next-auth's own routes",
  "POST /api/auth/[...nextauth]": "next-auth's own routes",
  "GET /api/feeds/[file]": "asked by calendar programs, without a session; its address is the secret",
  "GET /api/fhir/r4/[type]": "asked by other programs with a key",
  "GET /api/fhir/r4/[type]/[id]": "asked by other programs with a key",
  "GET /api/fhir/r4/metadata": "says nothing about any practice",
  "GET /api/health": "asked by machines, without a session",
  "GET /api/openapi.json": "says nothing about any practice",
  "POST /api/billing/card-events": "signed by the card service, without a session",
};

test("every handler is one verb behind the wrapper, or is named with its reason", () => {
  const wild = routes
    .filter(({ verb }) => verb === null)
    .map(({ method, address }) => `${method} ${address}`);
  expect(wild.sort()).toEqual(Object.keys(byHand).sort());
});

test("every verb behind a route is given out by its area, where the generated tests see it", () => {
  const hidden = routes.filter(({ verb }) => verb !== null && !known.has(verb));
  expect(hidden).toEqual([]);
});

test("a route lies under the area of its verb", () => {
  const astray = routes.filter(
    ({ verb, address }) =>
      verb !== null &&
      !address.startsWith(`/api/${known.get(verb)?.area}/`) &&
      address !== `/api/${known.get(verb)?.area}`,
  );
  expect(astray.map(({ address, verb }) => `${address}: ${verb}`)).toEqual([]);
});

test("a path's parameters are properties of the verb's input", () => {
  const lost = routes.flatMap(({ address, verb }) => {
    const input = known.get(verb ?? "")?.verb.input as { shape?: Record<string, unknown> } | undefined;
    const parameters = [...address.matchAll(/\[(\w+)\]/g)].map((match) => match[1] ?? "");
    return verb !== null && input?.shape
      ? parameters.filter((name) => !(name in (input.shape ?? {}))).map((name) => `${address}: ${name}`)
      : [];
  });
  expect(lost).toEqual([]);
});

test("a read needs no permission to write", () => {
  const writes = /\.(manage|register|edit|book|cancel|mark|write|sign|send|draft|issue|take-payment|refund)$/;
  const odd = routes.filter(
    ({ method, verb }) => method === "GET" && writes.test(known.get(verb ?? "")?.verb.permission ?? ""),
  );
  // Choosing what to book, what to invoice and whom to invite is read by those who do it, and by nobody else.
  expect(odd.map(({ verb }) => verb).sort()).toEqual([
    "findTimes",
    "getBookingChoices",
    "getCoverPlan",
    "getDraftingJob",
    "getFindingWeights",
    "getPracticeSettings",
    "listCoverPlaces",
    "listCoverPlans",
    "listProducts",
    "listStaff",
    "listToIssue",
    "listUnsignedNotes",
    "previewCourse",
    "previewExtension",
  ]);
});
