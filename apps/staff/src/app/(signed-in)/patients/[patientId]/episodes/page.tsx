import { can } from "@withy/core/access/can";
import { getClinicalPatient, listEpisodes } from "@withy/services/clinical";
import type { Metadata } from "next";
import { EpisodeList } from "@/features/clinical/components/episode-list";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";

export const metadata: Metadata = { title: "Episodes of care" };

export default async function EpisodesPage({ params }: PageProps<"/patients/[patientId]/episodes">) {
  const context = await requireContext("clinical.read");
  const { patientId } = await params;
  const patient = await orNotFound(getClinicalPatient(context, { patientId }));
  const episodes = await listEpisodes(context, { patientId });
  return (
    <EpisodeList patient={patient} episodes={episodes} canWrite={can(context.roles, "clinical.write")} />
  );
}
