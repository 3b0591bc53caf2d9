import { newId } from "@withy/core/ids";
import type { Context, SystemContext } from "@withy/services/context";
import type { TestPractice } from "./practice";
import type { TestPerson } from "./practice-staff";

/** The context of one of the practice's people at a desk: `contextFor(practice, "receptionist")`. */
export function contextFor(
  practice: TestPractice,
  person: TestPerson,
  overrides: Partial<Context> = {},
): Context {
  const member = practice.staff[person];
  return {
    practiceId: practice.practiceId,
    staffMemberId: member.id,
    staffName: `${member.givenName} ${member.familyName}`,
    sessionId: newId(),
    roles: member.roles,
    deskSiteId: member.homeSiteId,
    zone: practice.zone,
    requestId: newId(),
    idempotencyKey: null,
    clock: practice.clock,
    db: practice.db,
    ...overrides,
  };
}

/** What the worker, webhooks and signed-out forms act with. */
export function systemContextFor(practice: TestPractice): SystemContext {
  return { clock: practice.clock, db: practice.db, requestId: newId() };
}
