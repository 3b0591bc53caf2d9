// @vitest-environment node
import { readdirSync, readFileSync } from "node:fs";
import { Validator } from "@seriousme/openapi-schema-validator";
import { expect, test } from "vitest";
import { apiTable } from "./api-table";
import { openPath } from "./describe-operation";
import { handRoutes } from "./hand-routes";
import { openApiDocument } from "./openapi-document";

const app = new URL("../../app/", import.meta.url);
const handler =
  /export (?:const|async function|function) (GET|POST|PUT|PATCH|DELETE)\b(?:\s*=\s*route\(\s*(\w+))?/g;

interface Operation {
  operationId?: string;
  "x-permission"?: string;
  parameters?: { name: string; in: string; required?: boolean; schema: Record<string, unknown> }[];
  requestBody?: { content: Record<string, { schema: Record<string, unknown> }> };
  responses: Record<string, unknown>;
}

const document = openApiDocument() as { paths: Record<string, Record<string, Operation>> };

/** Every handler below the api folder, with its verb where it is one. */
const routes = readdirSync(app, { recursive: true, encoding: "utf8" })
  .filter((path) => path.startsWith("api/") && path.endsWith("/route.ts"))
  .flatMap((path) =>
    [
      ...readFileSync(new URL(path.replaceAll("[", "%5B").replaceAll("]", "%5D"), app), "utf8").matchAll(
        handler,
      ),
    ].map((match) => ({
      line: `${match[1]} /${path.replace("/route.ts", "")}`,
      method: (match[1] ?? "").toLowerCase(),
      address: `/${path.replace("/route.ts", "")}`,
      verb: match[2] ?? null,
    })),
  );

const operationOf = (method: string, address: string) => document.paths[openPath(address)]?.[method];

test("the document is valid by the OpenAPI 3.1 meta-schema", async () => {
  const validator = new Validator();
  const result = await validator.validate(structuredClone(document));
  expect(result.errors ?? []).toEqual([]);
  expect([result.valid, validator.version]).toEqual([true, "3.1"]);
});

test("every handler of every route file is in the table, and the table names nothing else", () => {
  const known = [...Object.keys(apiTable), ...Object.keys(handRoutes)];
  expect(known.toSorted(), "add the missing line to api-table.ts or hand-routes.ts").toEqual(
    routes.map(({ line }) => line).toSorted(),
  );
});

test("each operation is that of the verb behind its route, with its permission and its refusals", () => {
  expect(routes.length).toBeGreaterThan(90);
  for (const { line, method, address, verb } of routes) {
    const operation = operationOf(method, address);
    expect(operation, line).toBeDefined();
    if (verb === null || !operation) continue;
    expect(operation.operationId?.split(".")[1], line).toBe(verb);
    expect(operation["x-permission"], line).toBe(apiTable[line]?.permission);
    expect(Object.keys(operation.responses), line).toEqual(
      expect.arrayContaining(["2XX", "401", "403", "404", "409", "422", "500"]),
    );
  }
});

test("operations have a name of their own, and their inputs are told in place", () => {
  const ids = Object.values(document.paths).flatMap((path) =>
    Object.values(path).flatMap((operation) => operation.operationId ?? []),
  );
  // One verb may serve two addresses; it is then one act with one name, told apart by its path.
  expect(ids.length).toBeGreaterThan(90);
  const refs = [...JSON.stringify(document).matchAll(/"\$ref":"([^"]+)"/g)].map((match) => match[1]);
  expect(refs.filter((ref) => !ref?.startsWith("#/components/"))).toEqual([]);
});

test("a booking is told as it is asked for", () => {
  const book = operationOf("post", "/api/diary/appointments");
  const schema = book?.requestBody?.content["application/json"]?.schema as {
    required: string[];
    properties: Record<string, unknown>;
    additionalProperties: boolean;
  };
  expect(schema.required).toEqual(expect.arrayContaining(["patientId", "serviceId", "startsAt"]));
  expect(schema.additionalProperties).toBe(false);
  expect(book?.["x-permission"]).toBe("diary.book");
  const move = operationOf("post", "/api/diary/appointments/[appointmentId]/move");
  expect(move?.parameters?.map((p) => [p.in, p.name])).toEqual([
    ["path", "appointmentId"],
    ["header", "idempotency-key"],
  ]);
  const moved = move?.requestBody?.content["application/json"]?.schema as { properties: object };
  expect(Object.keys(moved.properties)).not.toContain("appointmentId");
});
