import { checkTreat } from "@withy/clinical/episodes/states";
import { type EpisodeView, saveGoalsInput } from "@withy/contracts/clinical";
import { refuseIf } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changeEpisode } from "./change-episode";
import { loadEpisode, loadSite, requireVersion } from "./episode-records";
import { episodeView } from "./episode-view";

/** Rewrites the goals; one that keeps its words keeps the day it was set and the day it was met. */
export const saveGoals = verb(
  "clinical.write",
  saveGoalsInput,
  async (ctx, input): Promise<EpisodeView> =>
    inTransaction(ctx, async (tx) => {
      const episode = await loadEpisode(tx, "clinical.write", input.episodeId, { lock: true });
      refuseIf(checkTreat(episode));
      requireVersion("episode", episode, input.version);
      const { zone } = await loadSite(tx, episode.siteId);
      const today = dayOf(tx.clock.now(), zone);
      const goals = input.goals.map(({ text, isMet }) => {
        const known = episode.goals.find((goal) => goal.text === text);
        return { text, setOn: known?.setOn ?? today, metOn: isMet ? (known?.metOn ?? today) : null };
      });
      const changed = await changeEpisode(tx, episode, { goals });
      await recordAudit(tx, {
        action: "episode.goals-saved",
        subjectKind: "episode",
        subjectId: episode.id,
        patientId: episode.patientId,
        siteId: episode.siteId,
        detail: { goals: goals.length, met: goals.filter((goal) => goal.metOn !== null).length },
      });
      return episodeView(tx, changed);
    }),
);
