import { checkTreat } from "@withy/clinical/episodes/states";
import { type NoteView, startNoteInput } from "@withy/contracts/clinical";
import { AppError, refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { type Refusal, refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { appointments, episodes, notes, services } from "@withy/db/schema";
import { and, count, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { loadEpisode, loadSite, loadStaffName } from "./episode-records";
import { loadNote } from "./note-records";
import { noteView } from "./note-view";

type Appointment = typeof appointments.$inferSelect;
type Episode = typeof episodes.$inferSelect;

/** Begins the note of one visit, or gives the one that is begun already. */
export const startNote = verb(
  "clinical.write",
  startNoteInput,
  async (ctx, input): Promise<NoteView> =>
    inTransaction(ctx, async (tx) => {
      const appointment = await loadRecord(tx, appointments, input.appointmentId, "appointment", {
        lock: true,
      });
      requireReach(tx, "clinical.write", appointment.siteId, "appointment");
      const begun = await findNoteOfVisit(tx, appointment.id);
      if (begun !== null) return noteView(tx, await loadNote(tx, "clinical.write", begun));
      await checkVisit(tx, appointment);
      const episode = await chooseEpisode(tx, appointment, input.episodeId ?? null);
      refuseIf(checkTreat(episode));
      const id = newId();
      const now = tx.clock.now();
      const kind = await kindOfNote(tx, appointment, episode.id);
      await tx.db.insert(notes).values({
        practiceId: tx.practiceId,
        id,
        episodeId: episode.id,
        patientId: appointment.patientId,
        appointmentId: appointment.id,
        authorId: tx.staffMemberId,
        kind,
        body: {},
        visitAt: appointment.startsAt,
        createdAt: now,
        updatedAt: now,
      });
      if (appointment.episodeId === null) await joinEpisode(tx, appointment.id, episode.id);
      await recordAudit(tx, {
        action: "note.started",
        subjectKind: "note",
        subjectId: id,
        patientId: appointment.patientId,
        siteId: appointment.siteId,
        detail: { kind },
      });
      return noteView(tx, await loadNote(tx, "clinical.write", id));
    }),
);

async function findNoteOfVisit(ctx: Context, appointmentId: string): Promise<string | null> {
  const [row] = await ctx.db
    .select({ id: notes.id })
    .from(notes)
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.appointmentId, appointmentId)))
    .limit(1);
  return row?.id ?? null;
}

async function checkVisit(ctx: Context, appointment: Appointment): Promise<void> {
  if (appointment.therapistId !== ctx.staffMemberId) {
    const name = await loadStaffName(ctx, appointment.therapistId);
    refuseIf(
      refusal(
        "not-your-visit",
        `This visit is in ${name}'s diary. Have it moved to yours before you write its note.`,
      ),
    );
  }
  if (appointment.state === "cancelled" || appointment.state === "noshow") {
    refuseIf(
      refusal(
        "visit-did-not-happen",
        "This visit was cancelled or not attended, so there is nothing to write. Undo that in the diary first.",
      ),
    );
  }
  const { zone } = await loadSite(ctx, appointment.siteId);
  refuseIf(notToday(dayOf(appointment.startsAt, zone), dayOf(ctx.clock.now(), zone)));
}

function notToday(visitDay: string, today: string): Refusal | null {
  if (visitDay <= today) return null;
  return refusal("visit-to-come", "This visit is on a later day. Write its note on the day.");
}

async function chooseEpisode(
  ctx: Context,
  appointment: Appointment,
  chosen: string | null,
): Promise<Episode> {
  const id = appointment.episodeId ?? chosen;
  if (id === null) {
    throw new AppError("refused", "This visit belongs to no episode yet. Choose one, or open a new one.", {
      kind: "episode-needed",
      fields: [{ field: "episodeId", message: "Choose the episode of this visit." }],
      detail: { patientId: appointment.patientId, appointmentId: appointment.id },
    });
  }
  const episode =
    appointment.episodeId === null
      ? await loadEpisode(ctx, "clinical.write", id)
      : await loadRecord(ctx, episodes, id, "episode");
  refuseIf(
    episode.patientId === appointment.patientId
      ? null
      : refusal("other-patient", "That episode is another patient's. Choose one of this patient's."),
  );
  return episode;
}

/** The first note of an episode is an initial assessment, and so is that of a visit booked as one. */
async function kindOfNote(
  ctx: Context,
  appointment: Appointment,
  episodeId: string,
): Promise<"initial" | "session"> {
  const service = await loadRecord(ctx, services, appointment.serviceId, "service");
  const [earlier] = await ctx.db
    .select({ n: count() })
    .from(notes)
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.episodeId, episodeId)));
  return service.kind === "initial" || (earlier?.n ?? 0) === 0 ? "initial" : "session";
}

async function joinEpisode(ctx: Context, appointmentId: string, episodeId: string): Promise<void> {
  await ctx.db
    .update(appointments)
    .set({ episodeId })
    .where(and(eq(appointments.practiceId, ctx.practiceId), eq(appointments.id, appointmentId)));
}
