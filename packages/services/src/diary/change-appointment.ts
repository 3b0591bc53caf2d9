import type { Permission } from "@withy/core/access/permissions";
import { stale } from "@withy/core/errors";
import { appointments } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";
import { readAppointment } from "./appointment-view";

export type AppointmentRow = typeof appointments.$inferSelect;

/** Takes the visit for this transaction, within reach and as the screen saw it. @throws not-found, stale */
export async function takeAppointment(
  ctx: Context,
  permission: Permission,
  input: { appointmentId: string; version: number },
): Promise<AppointmentRow> {
  const row = await loadRecord(ctx, appointments, input.appointmentId, "appointment", { lock: true });
  requireReach(ctx, permission, row.siteId, "appointment");
  if (row.version !== input.version)
    throw stale("appointment", { current: await readAppointment(ctx, row.id) });
  return row;
}

/** Writes the changed columns with the next version; the version guards against a writer on another node. */
export async function saveAppointment(
  ctx: Context,
  before: AppointmentRow,
  change: Partial<Omit<AppointmentRow, "practiceId" | "id" | "version" | "updatedAt">>,
): Promise<AppointmentRow> {
  const after = { ...before, ...change, version: before.version + 1, updatedAt: ctx.clock.now() };
  const [result] = await ctx.db
    .update(appointments)
    .set({ ...change, version: after.version, updatedAt: after.updatedAt })
    .where(
      and(
        eq(appointments.practiceId, before.practiceId),
        eq(appointments.id, before.id),
        eq(appointments.version, before.version),
      ),
    );
  if (result.affectedRows !== 1) throw stale("appointment");
  return after;
}
