import { type PatientView, patientIdInput } from "@withy/contracts/patients";
import { recordAudit } from "../audit/record-audit";
import { verb } from "../verb";
import { buildPatientView } from "./patient-view";

/** Opens one patient's record. Every opening is written down: the patient may ask who looked. */
export const getPatient = verb(
  "patients.read",
  patientIdInput,
  async (ctx, { patientId }): Promise<PatientView> => {
    const view = await buildPatientView(ctx, patientId);
    await recordAudit(ctx, {
      action: "patient.read",
      subjectKind: "patient",
      subjectId: patientId,
      patientId,
      siteId: view.homeSite.id,
    });
    return view;
  },
);
