import { getProgramme } from "@withy/services/clinical";
import { Page } from "@withy/ui/page";
import type { Metadata } from "next";
import { ProgrammeBuilder } from "@/features/programmes/components/programme-builder";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Home exercise programme" };

export default async function ProgrammePage({
  params,
  searchParams,
}: PageProps<"/exercises/programmes/[programmeId]">) {
  const ctx = await requireContext("clinical.read");
  const { programmeId } = await params;
  const { version } = await searchParams;
  const asked = version === undefined ? {} : { versionNumber: version };
  const view = await orNotFound(getProgramme(ctx, { programmeId, ...asked }));
  return (
    <Page>
      <ProgrammeBuilder key={`${view.id} ${view.versionNumber}`} first={view} />
    </Page>
  );
}
