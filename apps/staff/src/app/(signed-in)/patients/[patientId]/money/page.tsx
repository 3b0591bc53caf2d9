import { getPatientAccount } from "@withy/services/billing";
import { PageBody } from "@withy/ui/page";
import type { Metadata } from "next";
import { PatientMoney } from "@/features/patients/components/patient-money";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Money" };

export default async function PatientMoneyPage({ params }: PageProps<"/patients/[patientId]/money">) {
  const ctx = await requireContext("billing.read");
  const { patientId } = await params;
  const account = await orNotFound(getPatientAccount(ctx, { patientId }));
  return (
    <PageBody className="pbody">
      <PatientMoney account={account} />
    </PageBody>
  );
}
