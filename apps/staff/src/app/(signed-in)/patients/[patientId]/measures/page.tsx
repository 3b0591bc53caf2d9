import { can } from "@withy/core/access/can";
import { listEpisodes, listMeasures } from "@withy/services/clinical";
import type { Metadata } from "next";
import { MeasuresPage } from "@/features/clinical/components/measures-page";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";

export const metadata: Metadata = { title: "Measures" };

export default async function MeasuresRoute({
  params,
  searchParams,
}: PageProps<"/patients/[patientId]/measures">) {
  const context = await requireContext("clinical.read");
  const [{ patientId }, { episode: asked }] = await Promise.all([params, searchParams]);
  const episodes = await orNotFound(listEpisodes(context, { patientId }));
  const episode = episodes.find(({ id }) => id === asked) ?? episodes[0] ?? null;
  const measures = episode === null ? [] : await listMeasures(context, { episodeId: episode.id });
  const canWrite = can(context.roles, "clinical.write") && episode?.state === "open";
  return (
    <MeasuresPage
      key={episode?.id}
      patientId={patientId}
      episodes={episodes}
      episode={episode}
      measures={measures}
      canWrite={canWrite}
    />
  );
}
