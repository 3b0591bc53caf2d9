import "server-only";
import type { Problem } from "@withy/contracts/problem";
import { AppError, httpStatus, isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import type { Context } from "@withy/services/context";
import type { Verb } from "@withy/services/verb";
import type { NextRequest } from "next/server";
import { log } from "./log";
import { sessionCookieName, sessionFor } from "./session";

type RouteParams = { params: Promise<Record<string, string | string[] | undefined>> };
export type RouteHandler = (request: NextRequest, route: RouteParams) => Promise<Response>;

export interface RouteOptions<O> {
  status?: 200 | 201 | 202;
  /** For answers that are no JSON: a PDF, a redirect. */
  respond?: (answer: O, ctx: Context) => Response | Promise<Response>;
  /** Input that a browser sends in a header of its own accord, by the name of the field. */
  fromHeaders?: Readonly<Record<string, string>>;
}

const largestBody = 1_000_000;

/**
 * Makes a route handler of one verb: session, origin, body, the verb (which asks permission and parses), and the one
 * mapping of errors. A GET's input is its query, a write's its JSON body; path parameters win over both.
 */
// biome-ignore lint/suspicious/noExplicitAny: any verb's input type; the verb itself parses unknown data
export function route<O>(run: Verb<any, O>, options: RouteOptions<O> = {}): RouteHandler {
  return async (request, { params }) => {
    const requestId = newId();
    try {
      if (request.method !== "GET") checkOrigin(request);
      const token = request.cookies.get(sessionCookieName())?.value;
      const session = await sessionFor(token, requestId, readKey(request));
      if (!session)
        throw new AppError(
          "unauthenticated",
          "Your session has ended. Sign in again; what you typed stays on this page.",
        );
      const sent = readHeaders(request, options.fromHeaders ?? {});
      const input = { ...(await readInput(request)), ...sent, ...(await params) };
      const answer = await run(session.context, input);
      if (options.respond) return await options.respond(answer, session.context);
      return Response.json(answer ?? null, {
        status: options.status ?? 200,
        headers: { "x-request-id": requestId },
      });
    } catch (error) {
      return problemResponse(error, requestId, request.method, new URL(request.url).pathname);
    }
  };
}

/** A write must come from our own pages: the browser's Origin is this host, or it says "same-origin" itself. */
export function checkOrigin(request: Request): void {
  const origin = request.headers.get("origin");
  const host = request.headers.get("host");
  const isOurs =
    origin !== null
      ? URL.canParse(origin) && new URL(origin).host === host
      : request.headers.get("sec-fetch-site") === "same-origin";
  if (!isOurs)
    throw new AppError(
      "forbidden",
      "This request did not come from Withy's own pages, so nothing was changed.",
      { kind: "foreign-origin" },
    );
}

function readKey(request: Request): string | null {
  const key = request.headers.get("idempotency-key");
  if (key === null) return null;
  if (!/^[\w-]{8,64}$/.test(key))
    throw new AppError("invalid", "The Idempotency-Key header must be 8 to 64 letters, digits or dashes.");
  return key;
}

function readHeaders(request: Request, names: Readonly<Record<string, string>>): Record<string, string> {
  return Object.fromEntries(
    Object.entries(names).flatMap(([field, header]) => {
      const value = request.headers.get(header);
      return value === null ? [] : [[field, value]];
    }),
  );
}

async function readInput(request: NextRequest): Promise<Record<string, unknown>> {
  if (request.method === "GET") {
    const query: Record<string, unknown> = {};
    for (const key of new Set(request.nextUrl.searchParams.keys())) {
      const values = request.nextUrl.searchParams.getAll(key);
      query[key] = values.length > 1 ? values : values[0];
    }
    return query;
  }
  const text = await request.text();
  if (text.length > largestBody)
    throw new AppError("invalid", "That is too much at once. Send less than one megabyte.");
  if (text === "") return {};
  if (!request.headers.get("content-type")?.startsWith("application/json")) {
    throw new AppError("invalid", "Send the request as application/json.");
  }
  try {
    const body: unknown = JSON.parse(text);
    if (typeof body === "object" && body !== null && !Array.isArray(body))
      return body as Record<string, unknown>;
  } catch {
    // Answered below, as for any other shape.
  }
  throw new AppError("invalid", "The request's body must be one JSON object.");
}

/** Any failure as problem details. Bugs are logged with their request id and told as "unavailable" without detail. */
export function problemResponse(error: unknown, requestId: string, method: string, path: string): Response {
  const known = isAppError(error) ? error : null;
  if (!known) log.error({ requestId, method, path, error: describe(error) }, "request failed");
  const code = known?.code ?? "unavailable";
  const status = known ? httpStatus[code] : 500;
  const problem: Problem = {
    type: `/problems/${known?.kind ?? "fault"}`,
    title: known?.kind ?? "fault",
    status,
    detail:
      known?.message ??
      "Something went wrong on our side and nothing was changed. Try again; if it stays, tell us the request number.",
    code,
    kind: known?.kind ?? "fault",
    fields: known?.fields ?? [],
    requestId,
    more: known?.detail ?? {},
  };
  return Response.json(problem, {
    status,
    headers: { "content-type": "application/problem+json", "x-request-id": requestId },
  });
}

/** Name, message and place of an error. A failed statement comes as a `DatabaseError`, without its text and values. */
export function describe(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { name: typeof error };
  return { name: error.name, message: error.message, stack: error.stack };
}
