// @vitest-environment node
import { AppError, notFound } from "@withy/core/errors";
import type { Verb } from "@withy/services/verb";
import { NextRequest } from "next/server";
import { beforeEach, expect, test, vi } from "vitest";
import { z } from "zod";

vi.mock("server-only", () => ({}));
const sessionFor = vi.hoisted(() => vi.fn());
const logged = vi.hoisted(() => vi.fn());
vi.mock("./session", () => ({ sessionFor, sessionCookieName: () => "session" }));
vi.mock("./log", () => ({ log: { error: logged } }));

const { route } = await import("./run-route");

const host = "withy.example";
const work = vi.fn();
const verb = Object.assign(work, { permission: "diary.read", input: z.unknown() }) as unknown as Verb;

interface Sent {
  method?: string;
  body?: string;
  headers?: Record<string, string>;
  query?: string;
  params?: Record<string, string>;
}

function send({ method = "GET", body, headers = {}, query = "", params = {} }: Sent = {}) {
  const request = new NextRequest(`http://${host}/api/things${query}`, {
    method,
    headers: { host, cookie: "session=sealed", ...headers },
    ...(body === undefined ? {} : { body }),
  });
  return route(verb)(request, { params: Promise.resolve(params) });
}

const ours = { origin: `http://${host}`, "content-type": "application/json" };

beforeEach(() => {
  vi.clearAllMocks();
  sessionFor.mockResolvedValue({ context: { staffName: "Ana Ferreby" } });
  work.mockResolvedValue({ done: true });
});

test("a read's input is its query and its path, and the path wins", async () => {
  const answer = await send({ query: "?a=1&b=2&b=3&id=forged", params: { id: "real" } });
  expect(answer.status).toBe(200);
  expect(await answer.json()).toEqual({ done: true });
  expect(work).toHaveBeenCalledWith({ staffName: "Ana Ferreby" }, { a: "1", b: ["2", "3"], id: "real" });
});

test("a write's input is its body and its path, and its key reaches the context", async () => {
  const headers = { ...ours, "idempotency-key": "0123456789" };
  await send({ method: "POST", body: '{"name":"x","id":"forged"}', headers, params: { id: "real" } });
  expect(work.mock.calls[0]?.[1]).toEqual({ name: "x", id: "real" });
  expect(sessionFor).toHaveBeenCalledWith("sealed", expect.any(String), "0123456789");
});

test("without a live session nothing runs", async () => {
  sessionFor.mockResolvedValue(null);
  const answer = await send();
  expect(answer.status).toBe(401);
  expect(answer.headers.get("content-type")).toBe("application/problem+json");
  expect(work).not.toHaveBeenCalled();
});

test.each([
  ["of another site", { origin: "http://elsewhere.example" }],
  ["of the same name at another port", { origin: `http://${host}:8080` }],
  ["of a sandboxed page", { origin: "null" }],
  ["that does not say where it comes from", {}],
  ["without an origin, across sites", { "sec-fetch-site": "cross-site" }],
])("a write %s changes nothing", async (_, headers) => {
  const answer = await send({
    method: "POST",
    body: "{}",
    headers: { ...headers, "content-type": "application/json" },
  });
  expect(answer.status).toBe(403);
  expect(await answer.json()).toMatchObject({ kind: "foreign-origin" });
  expect(sessionFor).not.toHaveBeenCalled();
});

test.each([
  ["no JSON", "{", ours],
  ["a list", "[1]", ours],
  ["text", "null", ours],
  ["a form", "a=1", { ...ours, "content-type": "application/x-www-form-urlencoded" }],
  ["more than a megabyte", JSON.stringify({ text: "x".repeat(1_000_001) }), ours],
  ["a key that is none", "{}", { ...ours, "idempotency-key": "a b" }],
])("a body of %s is refused as invalid", async (_, body, headers) => {
  const answer = await send({ method: "POST", body, headers });
  expect(answer.status).toBe(422);
  expect(work).not.toHaveBeenCalled();
});

test("an expected refusal tells its kind, sentence, fields and what it offers", async () => {
  const fields = [{ field: "startsAt", message: "Taken." }];
  work.mockRejectedValue(
    new AppError("refused", "Taken.", { kind: "slot-taken", fields, detail: { next: 1 } }),
  );
  const answer = await send();
  expect(answer.status).toBe(409);
  expect(await answer.json()).toMatchObject({
    kind: "slot-taken",
    detail: "Taken.",
    fields,
    more: { next: 1 },
  });
  work.mockRejectedValue(notFound("visit"));
  expect((await send()).status).toBe(404);
  expect(logged).not.toHaveBeenCalled();
});

test("a fault is logged with its request number and told without its words", async () => {
  work.mockRejectedValue(new Error("select secret from patients"));
  const answer = await send();
  const problem = await answer.json();
  expect(answer.status).toBe(500);
  expect(JSON.stringify(problem)).not.toContain("secret");
  expect(logged.mock.calls[0]?.[0]).toMatchObject({ requestId: problem.requestId, method: "GET" });
});

test("a failed statement is logged by its number", async () => {
  const failed = new Error("The database refused a statement (error 1062, key PRIMARY).");
  work.mockRejectedValue(Object.assign(failed, { name: "DatabaseError" }));
  await send();
  expect(logged.mock.calls[0]?.[0]).toMatchObject({
    error: { name: "DatabaseError", message: "The database refused a statement (error 1062, key PRIMARY)." },
  });
});
