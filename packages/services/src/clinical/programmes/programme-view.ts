import { placeWords } from "@withy/clinical/episodes/sides";
import { sessionTime, weekSeconds } from "@withy/clinical/programmes/compute-time";
import type { ProgrammeVersionLine, ProgrammeView } from "@withy/contracts/programmes";
import { can } from "@withy/core/access/can";
import { formatPhone } from "@withy/core/identifiers/phone";
import { dayOf } from "@withy/core/zoned-time";
import { patients, practices, sites, staffMembers } from "@withy/db/schema";
import { and, eq, inArray } from "drizzle-orm";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { loadPatientForCare } from "../clinical-patient";
import type { EpisodeRow } from "../episode-records";
import { contentOf, type LoadedProgramme, listVersions, type ProgrammeVersionRow } from "./programme-records";

async function loadSender(ctx: Context, siteId: string) {
  const [row] = await ctx.db
    .select({ practice: practices.name, site: sites.name, phone: sites.phone, zone: sites.zone })
    .from(sites)
    .innerJoin(practices, eq(practices.id, sites.practiceId))
    .where(and(eq(sites.practiceId, ctx.practiceId), eq(sites.id, siteId)))
    .limit(1);
  if (!row) throw new Error("an episode's site is a foreign key, so it exists");
  return row;
}

async function staffNames(ctx: Context, ids: readonly string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map();
  const rows = await ctx.db
    .select({ id: staffMembers.id, given: staffMembers.givenName, family: staffMembers.familyName })
    .from(staffMembers)
    .where(and(eq(staffMembers.practiceId, ctx.practiceId), inArray(staffMembers.id, [...ids])));
  return new Map(rows.map((row) => [row.id, `${row.given} ${row.family}`]));
}

async function versionLines(
  ctx: Context,
  rows: readonly ProgrammeVersionRow[],
): Promise<ProgrammeVersionLine[]> {
  const ids = rows.flatMap((row) => (row.issuedBy === null ? [row.savedBy] : [row.savedBy, row.issuedBy]));
  const names = await staffNames(ctx, [...new Set(ids)]);
  return rows.map((row) => ({
    versionNumber: row.versionNumber,
    savedAt: row.savedAt.toISOString(),
    savedBy: names.get(row.savedBy) ?? "",
    issuedAt: row.issuedAt?.toISOString() ?? null,
    issuedBy: row.issuedBy === null ? null : (names.get(row.issuedBy) ?? ""),
  }));
}

export function episodePlace(episode: Pick<EpisodeRow, "region" | "side">): string {
  return placeWords(episode.region, episode.side);
}

/** A programme at one of its versions, with everything that its screen and its handout say. */
export async function programmeView(
  ctx: Context,
  { programme, episode }: LoadedProgramme,
  shown: ProgrammeVersionRow,
): Promise<ProgrammeView> {
  const sender = await loadSender(ctx, episode.siteId);
  const day = dayOf(ctx.clock.now(), sender.zone);
  const { view: patient } = await loadPatientForCare(ctx, programme.patientId, day);
  const person = await loadRecord(ctx, patients, programme.patientId, "patient");
  const content = contentOf(shown);
  const seconds = sessionTime(content).elapsedSeconds;
  const isOpen = episode.state === "open";
  const isCurrent = shown.versionNumber === programme.currentVersion;
  return {
    id: programme.id,
    title: programme.title,
    patient,
    calledName: person.preferredName ?? person.givenName,
    episode: { id: episode.id, problem: episode.problem, place: episodePlace(episode), isOpen },
    sender: { practice: sender.practice, site: sender.site, phone: formatPhone(sender.phone) },
    zone: sender.zone,
    versionNumber: shown.versionNumber,
    currentVersion: programme.currentVersion,
    isIssued: shown.issuedAt !== null,
    canWrite: isOpen && isCurrent && can(ctx.roles, "clinical.write", episode.siteId),
    content,
    sessionSeconds: seconds,
    weekSeconds: weekSeconds(seconds, content.sessionsPerWeek),
    versions: await versionLines(ctx, await listVersions(ctx, programme.id)),
    version: programme.version,
  };
}
