import { type ClinicalPatient, listEpisodesInput } from "@withy/contracts/clinical";
import { dayOf } from "@withy/core/zoned-time";
import { recordAudit } from "../audit";
import { verb } from "../verb";
import { loadPatientForCare } from "./clinical-patient";

/** The head of a patient's clinical pages, alerts included. */
export const getClinicalPatient = verb(
  "clinical.read",
  listEpisodesInput,
  async (ctx, { patientId }): Promise<ClinicalPatient> => {
    const { view } = await loadPatientForCare(ctx, patientId, dayOf(ctx.clock.now(), ctx.zone));
    await recordAudit(ctx, {
      action: "clinical-patient.read",
      subjectKind: "patient",
      subjectId: view.id,
      patientId: view.id,
    });
    return view;
  },
);
