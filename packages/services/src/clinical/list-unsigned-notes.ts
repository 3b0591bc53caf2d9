import { emptyHeadings } from "@withy/clinical/notes/check-note";
import { type UnsignedItem, unsignedNotesInput } from "@withy/contracts/clinical";
import { addMinutes } from "@withy/core/zoned-time";
import { appointments, notes, patients } from "@withy/db/schema";
import { and, asc, count, eq, gte, inArray, isNull, lt } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { verb } from "../verb";

/** Visits without a note are looked for this far back. */
const daysBack = 60;

/** What still waits for this therapist's name: their drafts, and their finished visits without a note; oldest first. */
export const listUnsignedNotes = verb(
  "clinical.write",
  unsignedNotesInput,
  async (ctx): Promise<UnsignedItem[]> => {
    const items = [...(await listDrafts(ctx)), ...(await listUnwritten(ctx))];
    items.sort((a, b) => a.visitAt.localeCompare(b.visitAt));
    await recordAudit(ctx, {
      action: "unsigned-notes.listed",
      subjectKind: "staff-member",
      subjectId: ctx.staffMemberId,
      detail: { items: items.length },
    });
    return items;
  },
);

async function listDrafts(ctx: Context): Promise<UnsignedItem[]> {
  const rows = await ctx.db
    .select({ note: notes, givenName: patients.givenName, familyName: patients.familyName })
    .from(notes)
    .innerJoin(patients, and(eq(patients.practiceId, notes.practiceId), eq(patients.id, notes.patientId)))
    .where(
      and(
        eq(notes.practiceId, ctx.practiceId),
        eq(notes.authorId, ctx.staffMemberId),
        eq(notes.state, "draft"),
      ),
    )
    .orderBy(asc(notes.visitAt))
    .limit(200);
  return rows.map(({ note, givenName, familyName }) => ({
    noteId: note.id,
    appointmentId: note.appointmentId,
    patientId: note.patientId,
    patientName: `${givenName} ${familyName}`,
    visitAt: note.visitAt.toISOString(),
    kind: note.kind,
    episodeId: note.episodeId,
    emptyHeadings: emptyHeadings(note.kind, note.body).map((heading) => heading.label),
  }));
}

function unwritten(ctx: Context) {
  const now = ctx.clock.now();
  return and(
    eq(appointments.practiceId, ctx.practiceId),
    eq(appointments.therapistId, ctx.staffMemberId),
    gte(appointments.startsAt, addMinutes(now, -daysBack * 24 * 60)),
    lt(appointments.startsAt, now),
    inArray(appointments.state, ["in-session", "fulfilled"]),
    isNull(notes.id),
  );
}

const noteOfVisit = and(
  eq(notes.practiceId, appointments.practiceId),
  eq(notes.appointmentId, appointments.id),
);

async function listUnwritten(ctx: Context): Promise<UnsignedItem[]> {
  const rows = await ctx.db
    .select({ appointment: appointments, givenName: patients.givenName, familyName: patients.familyName })
    .from(appointments)
    .innerJoin(
      patients,
      and(eq(patients.practiceId, appointments.practiceId), eq(patients.id, appointments.patientId)),
    )
    .leftJoin(notes, noteOfVisit)
    .where(unwritten(ctx))
    .orderBy(asc(appointments.startsAt))
    .limit(200);
  return rows.map(({ appointment, givenName, familyName }) => ({
    noteId: null,
    appointmentId: appointment.id,
    patientId: appointment.patientId,
    patientName: `${givenName} ${familyName}`,
    visitAt: appointment.startsAt.toISOString(),
    kind: null,
    episodeId: appointment.episodeId,
    emptyHeadings: [],
  }));
}

/** How many wait, for the tab in the head. Names nobody, so it is not a clinical read. */
export async function countUnsignedNotes(ctx: Context): Promise<number> {
  const [drafts] = await ctx.db
    .select({ n: count() })
    .from(notes)
    .where(
      and(
        eq(notes.practiceId, ctx.practiceId),
        eq(notes.authorId, ctx.staffMemberId),
        eq(notes.state, "draft"),
      ),
    );
  const [visits] = await ctx.db
    .select({ n: count() })
    .from(appointments)
    .leftJoin(notes, noteOfVisit)
    .where(unwritten(ctx));
  return (drafts?.n ?? 0) + (visits?.n ?? 0);
}
