import { listPayersInput, type PayerView } from "@withy/contracts/patients";
import { payers } from "@withy/db/schema";
import { asc, eq } from "drizzle-orm";
import { verb } from "../verb";

/** Insurers and employers that pay for patients. A practice has some dozens at most. */
export const listPayers = verb("patients.read", listPayersInput, (ctx): Promise<PayerView[]> => {
  return ctx.db
    .select({ id: payers.id, name: payers.name, kind: payers.kind })
    .from(payers)
    .where(eq(payers.practiceId, ctx.practiceId))
    .orderBy(asc(payers.name));
});
