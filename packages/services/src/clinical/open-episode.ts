import { checkSide } from "@withy/clinical/episodes/sides";
import { type EpisodeView, openEpisodeInput } from "@withy/contracts/clinical";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { appointments, episodes, patients } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { loadSite } from "./episode-records";
import { episodeView } from "./episode-view";

/** Opens a course of care for one problem, under the therapist who opens it. */
export const openEpisode = verb(
  "clinical.write",
  openEpisodeInput,
  async (ctx, input): Promise<EpisodeView> => {
    const site = await loadSite(ctx, input.siteId);
    requireReach(ctx, "clinical.write", input.siteId, "site");
    const wrongSide = checkSide(input.region, input.side);
    refuseIf(wrongSide === null ? null : refusal("side-and-region", wrongSide, "side"));
    return once(ctx, "episode.open", async (tx) => {
      const patient = await loadRecord(tx, patients, input.patientId, "patient");
      const now = tx.clock.now();
      const id = newId();
      const today = dayOf(now, site.zone);
      await tx.db.insert(episodes).values({
        practiceId: tx.practiceId,
        id,
        patientId: patient.id,
        therapistId: tx.staffMemberId,
        siteId: input.siteId,
        problem: input.problem,
        region: input.region,
        side: input.side,
        referralSource: input.referralSource,
        referredBy: input.referredBy,
        referredOn: input.referredOn ?? null,
        reason: input.reason,
        goals: input.goals.map((text) => ({ text, setOn: today, metOn: null })),
        plannedVisits: input.plannedVisits ?? null,
        openedOn: today,
        redFlags: {},
        createdAt: now,
        updatedAt: now,
      });
      if (input.appointmentId) await joinAppointment(tx, input.appointmentId, patient.id, id);
      await recordAudit(tx, {
        action: "episode.opened",
        subjectKind: "episode",
        subjectId: id,
        patientId: patient.id,
        siteId: input.siteId,
        detail: { region: input.region, side: input.side },
      });
      return episodeView(tx, await loadRecord(tx, episodes, id, "episode"));
    });
  },
);

/** Ties a visit of the same patient to the episode, where it belongs to none yet. */
async function joinAppointment(
  ctx: Context,
  appointmentId: string,
  patientId: string,
  episodeId: string,
): Promise<void> {
  const appointment = await loadRecord(ctx, appointments, appointmentId, "appointment", { lock: true });
  requireReach(ctx, "clinical.write", appointment.siteId, "appointment");
  refuseIf(
    appointment.patientId === patientId
      ? null
      : refusal(
          "other-patient",
          "That visit is another patient's. Open the episode from this patient's own visit.",
        ),
  );
  if (appointment.episodeId !== null) return;
  await ctx.db
    .update(appointments)
    .set({ episodeId })
    .where(and(eq(appointments.practiceId, ctx.practiceId), eq(appointments.id, appointmentId)));
}
