import { checkDischarge, checkReopen } from "@withy/clinical/episodes/states";
import { dischargeEpisodeInput, type EpisodeView, reopenEpisodeInput } from "@withy/contracts/clinical";
import { refuseIf } from "@withy/core/errors";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changeEpisode } from "./change-episode";
import { listNoteLines, loadEpisode, requireVersion } from "./episode-records";
import { episodeView } from "./episode-view";

/** Ends a course of care. Every note of it must be signed first. */
export const dischargeEpisode = verb(
  "clinical.sign",
  dischargeEpisodeInput,
  async (ctx, input): Promise<EpisodeView> =>
    inTransaction(ctx, async (tx) => {
      const episode = await loadEpisode(tx, "clinical.sign", input.episodeId, { lock: true });
      const lines = await listNoteLines(tx, episode.id);
      const unsignedNotes = lines.filter((line) => line.state === "draft").length;
      refuseIf(
        checkDischarge({ state: episode.state, unsignedNotes, signedNotes: lines.length - unsignedNotes }),
      );
      requireVersion("episode", episode, input.version);
      const changed = await changeEpisode(tx, episode, {
        state: "discharged",
        dischargedAt: tx.clock.now(),
        dischargedBy: tx.staffMemberId,
        outcome: input.outcome,
      });
      await recordAudit(tx, {
        action: "episode.discharged",
        subjectKind: "episode",
        subjectId: episode.id,
        patientId: episode.patientId,
        siteId: episode.siteId,
        detail: { outcome: input.outcome, notes: lines.length },
      });
      return episodeView(tx, changed);
    }),
);

/** Opens a discharged episode again, so that notes may be added. */
export const reopenEpisode = verb(
  "clinical.sign",
  reopenEpisodeInput,
  async (ctx, input): Promise<EpisodeView> =>
    inTransaction(ctx, async (tx) => {
      const episode = await loadEpisode(tx, "clinical.sign", input.episodeId, { lock: true });
      refuseIf(checkReopen(episode));
      requireVersion("episode", episode, input.version);
      const changed = await changeEpisode(tx, episode, {
        state: "open",
        dischargedAt: null,
        dischargedBy: null,
        outcome: null,
      });
      await recordAudit(tx, {
        action: "episode.reopened",
        subjectKind: "episode",
        subjectId: episode.id,
        patientId: episode.patientId,
        siteId: episode.siteId,
        detail: { earlierOutcome: episode.outcome },
      });
      return episodeView(tx, changed);
    }),
);
