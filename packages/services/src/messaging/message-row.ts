import { appointmentTemplates } from "@withy/contracts/message-words";
import {
  type MessageRow,
  type MessageTemplate,
  messageProblem,
  messageTemplates,
} from "@withy/contracts/messaging";
import type { OutboxRow } from "./claim-messages";

const templateOf = (text: string): MessageTemplate | null =>
  messageTemplates.find((known) => known === text) ?? null;

/** Their payload stays after sending, since there is no secret in it. */
const repeatable = new Set<string>(appointmentTemplates);

/** Whether it may go once more: one that failed, or one that arrived and was lost by its reader. */
export function canSendAgain(row: Pick<OutboxRow, "state" | "template">): boolean {
  return row.state === "failed" || (row.state === "sent" && repeatable.has(row.template));
}

/** One line of the list; null where its template is no longer known. */
export function messageRow(row: OutboxRow, patientName: string | null, maySend: boolean): MessageRow | null {
  const template = templateOf(row.template);
  if (!template) return null;
  const waits = row.state === "waiting" || row.state === "claimed";
  return {
    id: row.id,
    template,
    toAddress: row.toAddress,
    patientId: row.patientId,
    patientName,
    state: row.state,
    createdAt: row.createdAt.toISOString(),
    sentAt: row.sentAt?.toISOString() ?? null,
    dueAt: waits ? row.dueAt.toISOString() : null,
    attempts: row.attempts,
    problem: row.lastError !== null && row.state !== "sent" ? messageProblem(row.lastError) : null,
    canSendAgain: maySend && canSendAgain(row),
  };
}
