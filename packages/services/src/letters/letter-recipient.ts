import type { LetterRecipientView } from "@withy/contracts/letters";
import { gpPractices, type patients } from "@withy/db/schema";
import type { Context } from "../context";
import { findRecord } from "../load-record";

/** The patient's doctor at their surgery; an empty recipient, to be filled in, where none is on record. */
export async function recipientFor(
  ctx: Context,
  patient: typeof patients.$inferSelect,
): Promise<LetterRecipientView> {
  const surgery =
    patient.gpPracticeId === null ? null : await findRecord(ctx, gpPractices, patient.gpPracticeId);
  if (!surgery) return { kind: "gp", name: patient.gpName ?? "", addressLines: [], email: null };
  const address = [...surgery.addressLines, surgery.postcode];
  return patient.gpName
    ? { kind: "gp", name: patient.gpName, addressLines: [surgery.name, ...address], email: surgery.email }
    : { kind: "gp", name: surgery.name, addressLines: address, email: surgery.email };
}
