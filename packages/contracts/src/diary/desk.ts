import { z } from "zod";
import { idField, requiredText } from "../fields";
import { startField } from "./appointment";
import { idListField } from "./day";

export const holdTimeInput = z.strictObject({
  siteId: idField,
  therapistId: idField,
  startsAt: startField,
  durationMinutes: z.int("Enter a length in minutes.").min(5).max(480).default(30),
});

export const releaseHoldInput = z.strictObject({});

export const listHoldsInput = z.strictObject({
  /** Absent: the site of the desk. */
  siteIds: idListField,
});

/** A time that someone else is booking right now. Minutes are minutes after midnight by the site's clock. */
export interface HeldTime {
  readonly byName: string;
  readonly siteId: string;
  readonly therapistId: string;
  readonly day: string;
  readonly fromMinute: number;
  readonly untilMinute: number;
}

export const showPresenceInput = z.strictObject({ appointmentId: idField, isEditing: z.boolean() });

export const endPresenceInput = z.strictObject({ appointmentId: idField });

export const listPresenceInput = z.strictObject({ appointmentId: idField });

/** Someone else who has the appointment open. */
export interface OtherPerson {
  readonly name: string;
  readonly isEditing: boolean;
}

/** What stands in the fields of a form, by their names, as it was typed. */
const typedFields = z
  .record(
    z.string().max(30),
    z.union([z.string().max(400), z.array(z.string().max(60)).max(20)], "This cannot be put aside."),
  )
  .refine((fields) => Object.keys(fields).length <= 20, "This cannot be put aside.");

export const putAsideInput = z.strictObject({
  /** Something that lies in the tray already is put back with what has changed. */
  itemId: idField.nullish().transform((id) => id ?? null),
  kind: z.enum(["booking", "finding"]),
  title: requiredText(120, "Say what it is."),
  patientId: idField.nullish().transform((id) => id ?? null),
  typed: typedFields,
});

export const listPutAsideInput = z.strictObject({});

export const removePutAsideInput = z.strictObject({ itemId: idField });

export interface PutAsideItem {
  readonly id: string;
  readonly kind: "booking" | "finding";
  readonly title: string;
  readonly patient: { readonly id: string; readonly name: string; readonly bornOn: string } | null;
  readonly typed: Readonly<Record<string, string | readonly string[]>>;
  /** By the practice's clock. */
  readonly time: string;
  readonly putAsideAt: string;
}

export const saveViewInput = z.strictObject({
  name: requiredText(60, "Give the view a name."),
  /** Path and query of the diary, without the day. */
  address: z
    .string()
    .max(500, "This view names too many places to keep.")
    .regex(/^\/diary(\/week)?(\?[\w=&%-]*)?$/, "Only views of the diary can be kept."),
});

export const listSavedViewsInput = z.strictObject({});

export const removeSavedViewInput = z.strictObject({ viewId: idField });

export interface SavedView {
  readonly id: string;
  readonly name: string;
  readonly address: string;
}
