import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { verbs } from "../support/verbs";
import { readRoutes } from "./support/routes";

const table = "apps/staff/src/server/openapi/api-table.ts";

test("the document of the API names every route that is one verb, with that verb", () => {
  const areaOf = new Map(verbs.map(({ name, area }) => [name, area]));
  const wanted = readRoutes().flatMap(({ method, address, verb }) =>
    verb === null ? [] : `"${method} ${address}": ${areaOf.get(verb)}.${verb},`,
  );
  const text = readFileSync(new URL(`../../${table}`, import.meta.url), "utf8");
  const given = [...text.matchAll(/"[A-Z]+ \/api\/[^"]+":\s+[\w.]+,/g)].map(([line]) =>
    line.replace(/\s+/g, " "),
  );
  expect(given.toSorted(), `Put the missing line into ${table}`).toEqual(wanted.toSorted());
});
