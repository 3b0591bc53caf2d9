import { type AppointmentView, bookAppointmentInput } from "@withy/contracts/diary";
import { appointments } from "@withy/db/schema";
import { writeTogether } from "@withy/db/write-together";
import type { Context } from "../context";
import { messageWrite } from "../messaging";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { readAppointment, viewVisit } from "./appointment-view";
import type { AppointmentRow } from "./change-appointment";
import { claimWrite, isSlotTaken } from "./claim-slots";
import { newVisit } from "./new-visit";
import { claimOf, planTaken, planVisit, type VisitPlan } from "./plan-visit";
import { changeWrites } from "./record-change";
import { visitMessage } from "./send-visit-message";
import { newVisitRow, type VisitRow } from "./visit-row";

/** Writes the visit, its claims, its history and its message in one journey. @throws refused `slot-taken` */
async function writeVisit(tx: Context, row: AppointmentRow, plan: VisitPlan): Promise<VisitRow> {
  const visit = newVisitRow(row, { ...plan.setting.names, room_name: plan.room.name });
  const message = visitMessage(tx, "booking-confirmed", visit);
  if (plan.isFree === false) throw await planTaken(tx, row.id, plan);
  try {
    await writeTogether(tx.db, [
      tx.db.insert(appointments).values(row),
      claimWrite(tx, claimOf(plan, row.id)),
      ...changeWrites(tx, "booked", null, row),
      ...(message ? [messageWrite(tx, message)] : []),
    ]);
  } catch (error) {
    throw isSlotTaken(error) ? await planTaken(tx, row.id, plan) : error;
  }
  return visit;
}

/** Books a visit, or says who has the time and what is free next. */
export const bookAppointment = verb(
  "diary.book",
  bookAppointmentInput,
  async (ctx, input): Promise<AppointmentView> => {
    requireReach(ctx, "diary.book", input.siteId, "site");
    const { startsAt, durationMinutes, overrideReason, needsStepFree } = input;
    const wish = {
      ...{ startsAt, durationMinutes, cleanDownMinutes: null, overrideReason },
      ...{ movingId: null, needsStepFree },
    };
    const written: VisitRow[] = [];
    const { appointmentId } = await once(ctx, "appointment.book", async (tx) => {
      const plan = await planVisit(tx, input, wish);
      const row = newVisit(tx, input, plan);
      written.push(await writeVisit(tx, row, plan));
      return { appointmentId: row.id };
    });
    // A repeat's own rows were rolled back: the visit is the first one's.
    const row = written.find(({ id }) => id === appointmentId);
    return row ? viewVisit(ctx, row) : readAppointment(ctx, appointmentId);
  },
);
