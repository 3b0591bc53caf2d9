import "server-only";
import { httpStatus, isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import {
  type IssueCode,
  type KeyContext,
  openByKey,
  operationOutcome,
} from "@withy/services/diary/fhir/index";
import { env } from "./env";
import { log } from "./log";
import { describe } from "./run-route";
import { systemContext } from "./session";

/** The server's own address, as links in its answers name it. */
export const fhirBase = (): string => `${env().NEXTAUTH_URL.replace(/\/+$/, "")}/api/fhir/r4`;

export function fhirJson(resource: unknown, status = 200, more: Record<string, string> = {}): Response {
  return new Response(JSON.stringify(resource), {
    status,
    headers: { "content-type": "application/fhir+json; charset=utf-8", ...more },
  });
}

const issueOf: Readonly<Record<string, IssueCode>> = {
  unauthenticated: "login",
  "not-found": "not-found",
  "not-supported": "not-supported",
  "too-costly": "too-costly",
  "too-many-tries": "throttled",
  invalid: "invalid",
};

/** Any failure as an OperationOutcome; a bug is logged with its request id and told without detail. */
function failure(error: unknown, requestId: string): Response {
  if (!isAppError(error)) {
    log.error({ requestId, method: "GET", path: "/api/fhir/r4", error: describe(error) }, "request failed");
    const words = `Something went wrong on our side. Tell whoever runs Withy the request number ${requestId}.`;
    return fhirJson(operationOutcome("exception", words), 500);
  }
  const outcome = operationOutcome(issueOf[error.kind] ?? "processing", error.message);
  if (error.kind === "too-many-tries") return fhirJson(outcome, 429, { "retry-after": "300" });
  if (error.code === "unauthenticated") return fhirJson(outcome, 401, { "www-authenticate": "Bearer" });
  return fhirJson(outcome, error.code === "invalid" ? 400 : httpStatus[error.code]);
}

/** Answers a read of FHIR: the key of the request opens its practice, or the answer says why not. */
export async function answerFhir(
  request: Request,
  answer: (ctx: KeyContext) => Promise<unknown>,
): Promise<Response> {
  const requestId = newId();
  try {
    const ctx = await openByKey(systemContext(requestId), request.headers.get("authorization"));
    return fhirJson(await answer(ctx));
  } catch (error) {
    return failure(error, requestId);
  }
}
