import { type PatientRow, registerPatientInput } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { patients } from "@withy/db/schema";
import { recordAudit } from "../audit/record-audit";
import { once } from "../once";
import { verb } from "../verb";
import { changePayer } from "./change-payer";
import { patientColumns } from "./patient-columns";
import { toPatientRow } from "./patient-row";
import { refusePossibleDuplicate } from "./possible-duplicates";

/** Writes a new patient into the book. @throws refused "possible-duplicate" unless it is said to be someone else */
export const registerPatient = verb(
  "patients.register",
  registerPatientInput,
  (ctx, input): Promise<PatientRow> =>
    once(ctx, "patient.register", async (tx) => {
      const columns = await patientColumns(tx, input, tx.deskSiteId);
      if (!input.isSomeoneElse) await refusePossibleDuplicate(tx, input);
      const now = tx.clock.now();
      const id = newId();
      await tx.db
        .insert(patients)
        .values({ practiceId: tx.practiceId, id, ...columns, createdAt: now, updatedAt: now });
      await changePayer(tx, id, input.payer);
      await recordAudit(tx, {
        action: "patient.registered",
        subjectKind: "patient",
        subjectId: id,
        patientId: id,
        siteId: columns.homeSiteId,
        detail: input.isSomeoneElse ? { isSomeoneElse: true } : {},
      });
      return toPatientRow({ ...columns, id });
    }),
);
