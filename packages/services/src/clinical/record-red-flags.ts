import { checkTreat } from "@withy/clinical/episodes/states";
import { type FlagAnswer, readRedFlags, redFlagsFor } from "@withy/clinical/findings/red-flags";
import { type EpisodeView, recordRedFlagsInput } from "@withy/contracts/clinical";
import { refuseIf } from "@withy/core/errors";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changeEpisode } from "./change-episode";
import { loadEpisode, requireVersion } from "./episode-records";
import { episodeView } from "./episode-view";

/** Keeps what was asked and found, for the questions that belong to the region. */
export const recordRedFlags = verb(
  "clinical.write",
  recordRedFlagsInput,
  async (ctx, input): Promise<EpisodeView> =>
    inTransaction(ctx, async (tx) => {
      const episode = await loadEpisode(tx, "clinical.write", input.episodeId, { lock: true });
      refuseIf(checkTreat(episode));
      requireVersion("episode", episode, input.version);
      const redFlags: Record<string, FlagAnswer> = {};
      for (const { key } of redFlagsFor(episode.region).flatMap((group) => group.flags)) {
        redFlags[key] = input.answers[key] ?? "not-asked";
      }
      const changed = await changeEpisode(tx, episode, { redFlags });
      const reading = readRedFlags(episode.region, redFlags);
      await recordAudit(tx, {
        action: "episode.red-flags-recorded",
        subjectKind: "episode",
        subjectId: episode.id,
        patientId: episode.patientId,
        siteId: episode.siteId,
        detail: { asked: reading.asked, present: reading.present.length },
      });
      return episodeView(tx, changed);
    }),
);
