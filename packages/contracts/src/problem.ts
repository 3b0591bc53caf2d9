import type { ErrorCode, FieldError } from "@withy/core/errors";

/** An error on the wire: RFC 9457 problem details with our own members. */
export interface Problem {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly code: ErrorCode;
  readonly kind: string;
  readonly fields: readonly FieldError[];
  readonly requestId: string;
  readonly more: Readonly<Record<string, unknown>>;
}
