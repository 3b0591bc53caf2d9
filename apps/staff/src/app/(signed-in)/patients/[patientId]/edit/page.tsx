import { PageBody } from "@withy/ui/page";
import type { Metadata } from "next";
import { EditForm } from "@/features/patients/components/edit-form";
import { requireContext } from "@/server/context";
import { patientChoices } from "../../patient-choices";
import { openPatient } from "../open-patient";

export const metadata: Metadata = { title: "Details" };

export default async function EditPatientPage({ params }: PageProps<"/patients/[patientId]/edit">) {
  const ctx = await requireContext("patients.edit");
  const patient = await openPatient((await params).patientId);
  return (
    <PageBody className="pbody">
      <h2 className="vh">Details of {patient.name}</h2>
      <EditForm patient={patient} choices={await patientChoices(ctx)} />
    </PageBody>
  );
}
