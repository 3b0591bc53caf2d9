import { listMeasuresInput, type MeasureSeriesView } from "@withy/contracts/clinical";
import { dayOf } from "@withy/core/zoned-time";
import { recordAudit } from "../audit";
import { verb } from "../verb";
import { loadPatientForCare } from "./clinical-patient";
import { loadEpisode, loadSite } from "./episode-records";
import { listMeasureRows, seriesViews } from "./measure-series";

/** Every measure of an episode over time, with what its change means. */
export const listMeasures = verb(
  "clinical.read",
  listMeasuresInput,
  async (ctx, input): Promise<MeasureSeriesView[]> => {
    const episode = await loadEpisode(ctx, "clinical.read", input.episodeId);
    const { zone } = await loadSite(ctx, episode.siteId);
    const { view, sex } = await loadPatientForCare(ctx, episode.patientId, dayOf(ctx.clock.now(), zone));
    const rows = await listMeasureRows(ctx, episode.id);
    await recordAudit(ctx, {
      action: "measures.read",
      subjectKind: "episode",
      subjectId: episode.id,
      patientId: episode.patientId,
      siteId: episode.siteId,
      detail: { records: rows.length },
    });
    return seriesViews(rows, { age: view.age, sex });
  },
);
