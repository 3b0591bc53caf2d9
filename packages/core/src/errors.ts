import type { Refusal } from "./refusal";

export type ErrorCode =
  | "unauthenticated"
  | "forbidden"
  | "not-found"
  | "invalid"
  | "refused"
  | "stale"
  | "unavailable";

export const httpStatus: Record<ErrorCode, number> = {
  unauthenticated: 401,
  forbidden: 403,
  "not-found": 404,
  invalid: 422,
  refused: 409,
  stale: 412,
  unavailable: 503,
};

export interface FieldError {
  /** Dotted path in the input, for example "phone" or "lines.0.quantity". */
  readonly field: string;
  readonly message: string;
}

/**
 * Every failure that a caller may see. The message is a sentence for a person and says what to do; it never
 * carries personal data, since it goes to logs too.
 */
export class AppError extends Error {
  readonly code: ErrorCode;
  /** For "refused": the refusal's kind, for example "slot-taken". */
  readonly kind: string;
  readonly fields: readonly FieldError[];
  /** What a screen needs to offer a way on, for example the next free times. Never personal data. */
  readonly detail: Readonly<Record<string, unknown>>;

  constructor(
    code: ErrorCode,
    message: string,
    more: { kind?: string; fields?: readonly FieldError[]; detail?: Record<string, unknown> } = {},
  ) {
    super(message);
    this.name = "AppError";
    this.code = code;
    this.kind = more.kind ?? code;
    this.fields = more.fields ?? [];
    this.detail = more.detail ?? {};
  }
}

export function refused(r: Refusal, detail: Record<string, unknown> = {}): AppError {
  const fields = r.field === undefined ? [] : [{ field: r.field, message: r.message }];
  return new AppError("refused", r.message, { kind: r.kind, fields, detail });
}

/** Throws the refusal where a pure rule gave one. */
export function refuseIf(r: Refusal | null): void {
  if (r) throw refused(r);
}

/** A foreign row and a missing row answer the same. */
export function notFound(what = "record"): AppError {
  return new AppError(
    "not-found",
    `We could not find that ${what}. It may have been removed, or the link may be wrong.`,
  );
}

export function stale(what: string, detail: Record<string, unknown> = {}): AppError {
  return new AppError(
    "stale",
    `Someone else changed this ${what} while you had it open. Look at their version, then save again.`,
    { detail },
  );
}

export function isAppError(error: unknown): error is AppError {
  return error instanceof Error && error.name === "AppError" && "code" in error;
}
