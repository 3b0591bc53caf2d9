import { newId } from "@withy/core/ids";
import { auditEvents } from "@withy/db/schema";
import type { SystemContext } from "../context";

export interface AuditEntry {
  /** "appointment.booked", "note.read": subject, then what happened to it. */
  action: string;
  subjectKind: string;
  subjectId: string;
  patientId?: string | null;
  siteId?: string | null;
  /** Names of changed fields, states, amounts. Never clinical text, never a name or an address. */
  detail?: Record<string, unknown>;
}

type Actor = SystemContext & { readonly practiceId: string; readonly staffMemberId?: string | null };

/** Writes one audit row with the caller's transaction, so that neither stands without the other. */
export async function recordAudit(ctx: Actor, entry: AuditEntry): Promise<void> {
  await recordAudits(ctx, [entry]);
}

/** Writes one audit row for each entry in one statement, with the caller's transaction. */
export async function recordAudits(ctx: Actor, entries: readonly AuditEntry[]): Promise<void> {
  if (entries.length > 0) await auditWrite(ctx, entries);
}

/** The statement that writes these audit rows, to run with others. */
export function auditWrite(ctx: Actor, entries: readonly AuditEntry[]) {
  const at = ctx.clock.now();
  return ctx.db.insert(auditEvents).values(
    entries.map((entry) => ({
      practiceId: ctx.practiceId,
      id: newId(),
      at,
      actorId: ctx.staffMemberId ?? null,
      action: entry.action,
      subjectKind: entry.subjectKind,
      subjectId: entry.subjectId,
      patientId: entry.patientId ?? null,
      siteId: entry.siteId ?? null,
      requestId: ctx.requestId,
      detail: entry.detail ?? {},
    })),
  );
}
