import { type EpisodeView, episodeIdInput } from "@withy/contracts/clinical";
import { recordAudit } from "../audit";
import { verb } from "../verb";
import { loadEpisode } from "./episode-records";
import { episodeView } from "./episode-view";

export const getEpisode = verb("clinical.read", episodeIdInput, async (ctx, input): Promise<EpisodeView> => {
  const episode = await loadEpisode(ctx, "clinical.read", input.episodeId);
  await recordAudit(ctx, {
    action: "episode.read",
    subjectKind: "episode",
    subjectId: episode.id,
    patientId: episode.patientId,
    siteId: episode.siteId,
  });
  return episodeView(ctx, episode);
});
