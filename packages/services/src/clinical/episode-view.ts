import { placeWords } from "@withy/clinical/episodes/sides";
import {
  type Outcome,
  outcomes,
  type ReferralSource,
  referralSources,
} from "@withy/clinical/episodes/states";
import type { EpisodeSummary, EpisodeView } from "@withy/contracts/clinical";
import { dayOf } from "@withy/core/zoned-time";
import type { Context } from "../context";
import { loadPatientForCare } from "./clinical-patient";
import { type EpisodeRow, listNoteLines, loadSite, loadStaffName, type NoteLineRow } from "./episode-records";

const asOutcome = (text: string | null): Outcome | null =>
  outcomes.find((outcome) => outcome === text) ?? null;
const asReferral = (text: string): ReferralSource =>
  referralSources.find((source) => source === text) ?? "other";

function summary(
  episode: EpisodeRow,
  site: { name: string; zone: string },
  therapistName: string,
  lines: readonly NoteLineRow[],
): EpisodeSummary {
  return {
    id: episode.id,
    problem: episode.problem,
    region: episode.region,
    side: episode.side,
    place: placeWords(episode.region, episode.side),
    state: episode.state,
    openedOn: episode.openedOn,
    dischargedOn: episode.dischargedAt === null ? null : dayOf(episode.dischargedAt, site.zone),
    therapistName,
    siteName: site.name,
    notes: lines.length,
    unsignedNotes: lines.filter((line) => line.state === "draft").length,
  };
}

export async function episodeSummary(ctx: Context, episode: EpisodeRow): Promise<EpisodeSummary> {
  const site = await loadSite(ctx, episode.siteId);
  const lines = await listNoteLines(ctx, episode.id);
  return summary(episode, site, await loadStaffName(ctx, episode.therapistId), lines);
}

export async function episodeView(ctx: Context, episode: EpisodeRow): Promise<EpisodeView> {
  const site = await loadSite(ctx, episode.siteId);
  const lines = await listNoteLines(ctx, episode.id);
  const today = dayOf(ctx.clock.now(), site.zone);
  const patient = await loadPatientForCare(ctx, episode.patientId, today);
  return {
    ...summary(episode, site, await loadStaffName(ctx, episode.therapistId), lines),
    patient: patient.view,
    zone: site.zone,
    siteId: episode.siteId,
    therapistId: episode.therapistId,
    referralSource: asReferral(episode.referralSource),
    referredBy: episode.referredBy,
    referredOn: episode.referredOn,
    reason: episode.reason,
    goals: episode.goals,
    plannedVisits: episode.plannedVisits,
    outcome: asOutcome(episode.outcome),
    redFlags: episode.redFlags,
    noteLines: lines.map((line, i) => ({
      id: line.id,
      kind: line.kind,
      state: line.state,
      visitNumber: i + 1,
      visitAt: line.visitAt.toISOString(),
      authorName: `${line.givenName} ${line.familyName}`,
      addenda: line.addenda,
    })),
    version: episode.version,
  };
}
