import { z } from "zod";
import { auditSubjects } from "./audit-subjects";
import { idField, pageFields, plainDateField } from "./fields";
import type { Page } from "./page";

const blank = z.literal("").transform(() => undefined);

/** As a query string carries it: an empty choice is no filter. */
export const listAuditInput = z.strictObject({
  actorId: z.union([blank, idField]).optional(),
  patientId: z.union([blank, idField]).optional(),
  subjectKind: z.union([blank, z.enum(auditSubjects)]).optional(),
  from: z.union([blank, plainDateField]).optional(),
  until: z.union([blank, plainDateField]).optional(),
  ...pageFields,
});
export type ListAuditInput = z.input<typeof listAuditInput>;

export interface AuditRow {
  readonly id: string;
  readonly day: string;
  readonly time: string;
  readonly actorName: string;
  /** "appointment.booked". */
  readonly action: string;
  readonly subjectKind: string;
  readonly subjectId: string;
  readonly patientId: string | null;
  readonly patientName: string | null;
  readonly siteName: string | null;
  readonly detail: Readonly<Record<string, unknown>>;
}

export interface AuditPage extends Page<AuditRow> {
  /** More match than are counted; narrow the filter to reach them. */
  readonly isCutShort: boolean;
}
