import { readRoutes } from "../architecture/support/routes";
import { expect, test } from "./support/journey";

const routes = readRoutes().filter(({ verb }) => verb !== null);
const filled = (address: string) => address.replaceAll(/\[\w+\]/g, "019d0000-0000-7000-8000-000000000000");

test("no route answers without a session", async ({ request, baseURL }) => {
  for (const { method, address } of routes) {
    const answer = await request.fetch(filled(address), {
      method,
      headers: { origin: baseURL ?? "" },
      ...(method === "GET" ? {} : { data: {} }),
    });
    expect(answer.status(), `${method} ${address}`).toBe(401);
    expect(answer.headers()["content-type"], `${method} ${address}`).toContain("application/problem+json");
  }
});

test("no write is taken from another site's page, or from a sender that does not say where it comes from", async ({
  request,
}) => {
  const writes = routes.filter(({ method }) => method !== "GET");
  expect(writes.length).toBeGreaterThan(20);
  for (const { method, address } of writes) {
    for (const headers of [{ origin: "https://elsewhere.example" }, { "sec-fetch-site": "cross-site" }]) {
      const answer = await request.fetch(filled(address), { method, headers, data: {} });
      expect(answer.status(), `${method} ${address}`).toBe(403);
    }
  }
});

test("pages carry the headers that keep others out", async ({ request }) => {
  const answer = await request.get("/sign-in");
  const headers = answer.headers();
  expect(headers["content-security-policy"]).toMatch(/script-src 'self' 'nonce-[^']+' 'strict-dynamic'(;| )/);
  expect(headers["content-security-policy"]).not.toMatch(/script-src[^;]*unsafe-inline/);
  expect(headers["x-content-type-options"]).toBe("nosniff");
  expect(headers["referrer-policy"]).toBe("same-origin");
  expect(headers["x-powered-by"]).toBeUndefined();
});
