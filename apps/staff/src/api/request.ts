import type { Problem } from "@withy/contracts/problem";

/** A refusal or failure told by the server, with its sentence, its fields and what it offers. */
export class ApiError extends Error {
  readonly status: number;
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail);
    this.name = "ApiError";
    this.status = problem.status;
    this.problem = problem;
  }
}

type Query = Record<string, string | number | boolean | readonly string[] | null | undefined>;

function withQuery(path: string, query: Query): string {
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    if (value === null || value === undefined || value === "") continue;
    for (const one of Array.isArray(value) ? value : [value]) search.append(key, String(one));
  }
  const text = search.toString();
  return text === "" ? path : `${path}?${text}`;
}

async function send<T>(path: string, init: RequestInit): Promise<T> {
  let response: Response;
  try {
    response = await fetch(path, { ...init, credentials: "same-origin" });
  } catch {
    throw new ApiError(offline);
  }
  const body: unknown = await response.json().catch(() => null);
  if (response.ok) return body as T;
  throw new ApiError(isProblem(body) ? body : { ...offline, status: response.status });
}

function isProblem(body: unknown): body is Problem {
  return typeof body === "object" && body !== null && "detail" in body && "code" in body;
}

const offline: Problem = {
  type: "/problems/offline",
  title: "offline",
  status: 503,
  detail: "Withy could not be reached. Check the connection and try again; what you typed stays here.",
  code: "unavailable",
  kind: "offline",
  fields: [],
  requestId: "",
  more: {},
};

/** Reads from a GET route. */
export function get<T>(path: string, query: Query = {}, signal?: AbortSignal): Promise<T> {
  return send<T>(withQuery(path, query), signal ? { signal } : {});
}

/**
 * Writes through a route.
 * @param idempotencyKey made once for each filled-in form, so that a repeat of the same save acts once
 */
export function write<T>(
  method: "POST" | "PUT" | "PATCH" | "DELETE",
  path: string,
  body: unknown = {},
  idempotencyKey?: string,
): Promise<T> {
  const headers: Record<string, string> = { "content-type": "application/json" };
  if (idempotencyKey !== undefined) headers["idempotency-key"] = idempotencyKey;
  return send<T>(path, { method, headers, body: JSON.stringify(body) });
}
