import { can } from "@withy/core/access/can";
import { listEpisodes } from "@withy/services/clinical";
import type { Metadata } from "next";
import { EpisodeList } from "@/features/clinical/components/episode-list";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";

export const metadata: Metadata = { title: "Episodes of care" };

export default async function EpisodesPage({ params }: PageProps<"/patients/[patientId]/episodes">) {
  const context = await requireContext("clinical.read");
  const { patientId } = await params;
  const episodes = await orNotFound(listEpisodes(context, { patientId }));
  return (
    <EpisodeList patientId={patientId} episodes={episodes} canWrite={can(context.roles, "clinical.write")} />
  );
}
