import { listProgrammes } from "@withy/services/clinical";
import type { Metadata } from "next";
import { ProgrammeList } from "@/features/programmes/components/programme-list";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Home exercises" };

export default async function ProgrammesPage({ params }: PageProps<"/patients/[patientId]/programme">) {
  const ctx = await requireContext("clinical.read");
  const { patientId } = await params;
  const view = await orNotFound(listProgrammes(ctx, { patientId }));
  return <ProgrammeList view={view} zone={ctx.zone} />;
}
