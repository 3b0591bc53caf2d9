import { referralSources } from "@withy/clinical/episodes/states";
import { redFlagsFor } from "@withy/clinical/findings/red-flags";
import { dayOf } from "@withy/core/zoned-time";
import { appointments, patients } from "@withy/db/schema";
import type { DischargeFacts, RedFlagFacts } from "@withy/documents/letter/discharge-facts";
import { and, asc, eq } from "drizzle-orm";
import { type EpisodeRow, loadSite } from "../clinical/episode-records";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { measureFacts } from "./gather-measures";
import { listNotes, noteFacts } from "./gather-notes";
import { programmeFact } from "./gather-programme";
import { recipientFor } from "./letter-recipient";

/** The facts of the letter, and what only the checks before signing need. */
export interface GatheredFacts {
  readonly facts: DischargeFacts;
  readonly unsignedNotes: number;
  readonly visitsBooked: number;
}

async function visitFacts(ctx: Context, episodeId: string, zone: string) {
  const rows = await ctx.db
    .select({ state: appointments.state, startsAt: appointments.startsAt })
    .from(appointments)
    .where(and(eq(appointments.practiceId, ctx.practiceId), eq(appointments.episodeId, episodeId)))
    .orderBy(asc(appointments.startsAt));
  const now = ctx.clock.now();
  const attended = rows.filter(
    (row) => row.state === "fulfilled" || row.state === "in-session" || row.state === "arrived",
  );
  const days = attended.map((row) => dayOf(row.startsAt, zone));
  return {
    visits: {
      attended: attended.length,
      missed: rows.filter((row) => row.state === "noshow").length,
      firstOn: days[0] ?? null,
      lastOn: days.at(-1) ?? null,
    },
    booked: rows.filter((row) => (row.state === "booked" || row.state === "confirmed") && row.startsAt > now)
      .length,
  };
}

function redFlagFacts(episode: EpisodeRow): RedFlagFacts {
  const flags = redFlagsFor(episode.region).flatMap((group) => group.flags);
  const answered = (answer: "present" | "absent") =>
    flags.filter((flag) => episode.redFlags[flag.key] === answer).map((flag) => flag.question);
  const [present, absent] = [answered("present"), answered("absent")];
  return { present, absent, notAsked: flags.length - present.length - absent.length };
}

/** Everything that the record holds for a discharge letter of this episode. Nothing is taken from an unsigned note. */
export async function gatherDischargeFacts(ctx: Context, episode: EpisodeRow): Promise<GatheredFacts> {
  const { zone } = await loadSite(ctx, episode.siteId);
  const today = dayOf(ctx.clock.now(), zone);
  const patient = await loadRecord(ctx, patients, episode.patientId, "patient");
  const noteRows = await listNotes(ctx, episode.id);
  const { visits, booked } = await visitFacts(ctx, episode.id, zone);
  const recipient = await recipientFor(ctx, patient);
  const source = referralSources.find((known) => known === episode.referralSource) ?? "other";
  const facts: DischargeFacts = {
    today,
    patient: { id: patient.id, name: `${patient.givenName} ${patient.familyName}` },
    recipientIsReferrer:
      source === "gp" && (episode.referredBy === null || episode.referredBy === recipient.name),
    episode: {
      id: episode.id,
      problem: episode.problem,
      side: episode.side,
      openedOn: episode.openedOn,
      referral: { source, by: episode.referredBy, on: episode.referredOn, reason: episode.reason },
      goals: episode.goals,
      redFlags: redFlagFacts(episode),
    },
    visits,
    ...noteFacts(noteRows, zone),
    measures: await measureFacts(ctx, episode, today),
    programme: await programmeFact(ctx, episode.id, zone),
  };
  return {
    facts,
    unsignedNotes: noteRows.filter((row) => row.state === "draft").length,
    visitsBooked: booked,
  };
}
