import { PageBody } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import type { Metadata } from "next";
import { LooksList } from "@/features/patients/components/looks-list";
import { requireContext } from "@/server/context";
import { openPatient } from "../open-patient";

export const metadata: Metadata = { title: "Who looked" };

export default async function LooksPage({ params }: PageProps<"/patients/[patientId]/looks">) {
  await requireContext("audit.read");
  const patient = await openPatient((await params).patientId);
  return (
    <PageBody className="pbody">
      <SectionHead title="Who looked" aside="everyone who opened or changed the record, newest first" />
      <LooksList patientId={patient.id} />
    </PageBody>
  );
}
