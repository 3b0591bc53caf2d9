import { can } from "@withy/core/access/can";
import { getEpisode, listMeasures } from "@withy/services/clinical";
import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { EpisodePage } from "@/features/clinical/components/episode-page";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";

export const metadata: Metadata = { title: "Episode of care" };

export default async function EpisodeRoute({
  params,
}: PageProps<"/patients/[patientId]/episodes/[episodeId]">) {
  const context = await requireContext("clinical.read");
  const { patientId, episodeId } = await params;
  const episode = await orNotFound(getEpisode(context, { episodeId }));
  if (episode.patient.id !== patientId) notFound();
  const measures = await listMeasures(context, { episodeId });
  return (
    <EpisodePage
      episode={episode}
      measures={measures}
      canWrite={can(context.roles, "clinical.write", episode.siteId)}
    />
  );
}
