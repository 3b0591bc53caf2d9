import {
  getTimelineInput,
  type TimelineEntry,
  type TimelineKind,
  type TimelineView,
} from "@withy/contracts/patients";
import { can } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { patients } from "@withy/db/schema";
import { recordAudit } from "../../audit/record-audit";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { verb } from "../../verb";
import { readCursor, type Slice, writeCursor } from "./cursor";
import { messageEntries } from "./message-entries";
import { invoiceEntries, paymentEntries } from "./money-entries";
import { letterEntries, measureEntries, noteEntries } from "./note-entries";
import { visitEntries } from "./visit-entries";

interface Source {
  kind: TimelineKind;
  /** Without it the source is not asked at all. */
  permission: Permission;
  read: (ctx: Context, slice: Slice) => Promise<TimelineEntry[]>;
}

const sources: readonly Source[] = [
  { kind: "visits", permission: "diary.read", read: visitEntries },
  { kind: "notes", permission: "diary.read", read: noteEntries },
  { kind: "measures", permission: "clinical.read", read: measureEntries },
  { kind: "letters", permission: "letters.read", read: letterEntries },
  { kind: "money", permission: "billing.read", read: invoiceEntries },
  { kind: "money", permission: "billing.read", read: paymentEntries },
  { kind: "messages", permission: "messaging.read", read: messageEntries },
];

/** Everything that happened with a patient, newest first: one read of each source, each no longer than the page. */
export const getTimeline = verb(
  "patients.read",
  getTimelineInput,
  async (ctx, { patientId, kind, before, size }): Promise<TimelineView> => {
    const patient = await loadRecord(ctx, patients, patientId, "patient");
    const slice = { patientId, before: readCursor(before), limit: size + 1 };
    const asked = sources.filter(
      (source) => (kind === "all" || source.kind === kind) && can(ctx.roles, source.permission),
    );
    const found = await Promise.all(asked.map((source) => source.read(ctx, slice)));
    const entries = found.flat().sort(newestFirst);
    const shown = entries.slice(0, size);
    const last = shown.at(-1);
    await recordAudit(ctx, {
      action: "patient.timeline-read",
      subjectKind: "patient",
      subjectId: patientId,
      patientId,
      siteId: patient.homeSiteId,
      detail: { kind },
    });
    return { entries: shown, next: last && entries.length > size ? writeCursor(last) : null };
  },
);

function newestFirst(a: TimelineEntry, b: TimelineEntry): number {
  return b.at.localeCompare(a.at) || b.id.localeCompare(a.id);
}
