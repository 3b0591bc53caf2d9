import { editPatientInput, type PatientView } from "@withy/contracts/patients";
import { stale } from "@withy/core/errors";
import { patients } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changePayer } from "./change-payer";
import { patientColumns } from "./patient-columns";
import { buildPatientView } from "./patient-view";
import { refusePossibleDuplicate } from "./possible-duplicates";

type PatientColumns = Awaited<ReturnType<typeof patientColumns>>;

const tellsApart = ["givenName", "familyName", "bornOn", "phone", "nhsNumber"] as const;
const kept = new Set(["nameLastFirst", "nameFirstLast", "phoneReversed"]);

/** Saves a patient's details. @throws stale with the other person's version where it was saved in between */
export const editPatient = verb(
  "patients.edit",
  editPatientInput,
  (ctx, { patientId, version, ...input }): Promise<PatientView> =>
    inTransaction(ctx, async (tx) => {
      const before = await loadRecord(tx, patients, patientId, "patient", { lock: true });
      if (before.version !== version)
        throw stale("patient's details", { theirs: await buildPatientView(tx, patientId) });
      const columns = await patientColumns(tx, input, before.homeSiteId);
      const changed = changedColumns(before, columns);
      if (!input.isSomeoneElse && tellsApart.some((name) => changed.includes(name)))
        await refusePossibleDuplicate(tx, input, patientId);
      if (await changePayer(tx, patientId, input.payer)) changed.push("payer");
      if (changed.length > 0) {
        await tx.db
          .update(patients)
          .set({ ...columns, version: version + 1, updatedAt: tx.clock.now() })
          .where(and(eq(patients.practiceId, tx.practiceId), eq(patients.id, patientId)));
        await recordAudit(tx, {
          action: "patient.edited",
          subjectKind: "patient",
          subjectId: patientId,
          patientId,
          siteId: columns.homeSiteId,
          detail: { changed },
        });
      }
      return buildPatientView(tx, patientId);
    }),
);

/** Names of the columns that differ, without those that follow from others. */
function changedColumns(before: typeof patients.$inferSelect, after: PatientColumns): string[] {
  const names = Object.keys(after) as (keyof PatientColumns)[];
  return names.filter(
    (name) => !kept.has(name) && JSON.stringify(before[name]) !== JSON.stringify(after[name]),
  );
}
