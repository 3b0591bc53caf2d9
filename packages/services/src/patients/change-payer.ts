import type { PatientDetails } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { patientPayers, payers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

type Payer = PatientDetails["payer"];

/**
 * Makes this the patient's current payer. The row before stays, since visits were authorised and billed under it.
 * @returns whether anything changed
 */
export async function changePayer(tx: Context, patientId: string, payer: Payer): Promise<boolean> {
  const ofPatient = and(
    eq(patientPayers.practiceId, tx.practiceId),
    eq(patientPayers.patientId, patientId),
    eq(patientPayers.isCurrent, true),
  );
  const [current] = await tx.db.select().from(patientPayers).where(ofPatient).limit(1);
  if (isSame(current ?? null, payer)) return false;
  if (current) await tx.db.update(patientPayers).set({ isCurrent: false }).where(ofPatient);
  if (payer !== null) {
    await loadRecord(tx, payers, payer.payerId, "payer");
    await tx.db.insert(patientPayers).values({
      practiceId: tx.practiceId,
      id: newId(),
      patientId,
      ...payer,
      isCurrent: true,
      createdAt: tx.clock.now(),
    });
  }
  return true;
}

function isSame(current: typeof patientPayers.$inferSelect | null, payer: Payer): boolean {
  if (current === null || payer === null) return current === null && payer === null;
  return (
    current.payerId === payer.payerId &&
    current.policyNumber === payer.policyNumber &&
    current.authorisationCode === payer.authorisationCode &&
    current.sessionsAuthorised === payer.sessionsAuthorised &&
    current.excessPence === payer.excessPence
  );
}
