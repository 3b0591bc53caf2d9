import type { RoleHolding } from "@withy/core/access/can";
import type { Clock } from "@withy/core/clock";
import type { Database } from "@withy/db/client";

/**
 * Who acts, where and when: the first argument of every verb. The practice comes from the session and from
 * nowhere else. Inside a transaction `db` is that transaction.
 */
export interface Context {
  readonly practiceId: string;
  readonly staffMemberId: string;
  readonly staffName: string;
  readonly sessionId: string;
  readonly roles: readonly RoleHolding[];
  /** The site at whose desk the browser stands; screens start there. It grants nothing. */
  readonly deskSiteId: string;
  /** The practice's zone, where no site is at hand. */
  readonly zone: string;
  readonly requestId: string;
  /** Sent by the browser with a write that must not happen twice. */
  readonly idempotencyKey: string | null;
  readonly clock: Clock;
  readonly db: Database;
}

/** What signed-out forms, webhooks and the worker have: no person, no rights. */
export type SystemContext = Pick<Context, "clock" | "db" | "requestId">;
