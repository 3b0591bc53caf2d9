import "@/features/patients/patients.css";
import { can } from "@withy/core/access/can";
import { Page } from "@withy/ui/page";
import type { Metadata } from "next";
import { PatientHead } from "@/features/patients/components/patient-head";
import { requireContext } from "@/server/context";
import { openPatient } from "./open-patient";

export async function generateMetadata({ params }: LayoutProps<"/patients/[patientId]">): Promise<Metadata> {
  const patient = await openPatient((await params).patientId);
  return { title: { template: `%s, ${patient.name}: Withy`, default: `${patient.name}` } };
}

export default async function PatientLayout({ children, params }: LayoutProps<"/patients/[patientId]">) {
  const ctx = await requireContext("patients.read");
  const patient = await openPatient((await params).patientId);
  return (
    <Page className="pat">
      <PatientHead
        patient={patient}
        mayEdit={can(ctx.roles, "patients.edit")}
        mayBook={can(ctx.roles, "diary.book")}
      />
      {children}
    </Page>
  );
}
