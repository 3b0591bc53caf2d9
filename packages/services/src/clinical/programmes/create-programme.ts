import { emptyProgramme } from "@withy/clinical/programmes/new-item";
import type { Programme } from "@withy/clinical/programmes/programme";
import { createProgrammeInput, type ProgrammeView } from "@withy/contracts/programmes";
import { notFound } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { programmes, programmeVersions } from "@withy/db/schema";
import { and, count, eq } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { once } from "../../once";
import { verb } from "../../verb";
import { type EpisodeRow, loadEpisode } from "../episode-records";
import { contentOf, loadProgramme, loadVersion } from "./programme-records";
import { programmeView } from "./programme-view";
import { requireOpenEpisode } from "./require-open-episode";

/** Starts a programme for an open episode, empty or from an earlier one of the same patient. */
export const createProgramme = verb(
  "clinical.write",
  createProgrammeInput,
  async (ctx, input): Promise<ProgrammeView> =>
    once(ctx, "programme.create", async (tx) => {
      const episode = await loadEpisode(tx, "clinical.write", input.episodeId, { lock: true });
      requireOpenEpisode(episode);
      const content = await startingContent(tx, episode, input.copyOf);
      const title = input.title ?? `Programme ${(await countOf(tx, episode.patientId)) + 1}`;
      const programme = await insertProgramme(tx, episode, title, content);
      await recordAudit(tx, {
        action: "programme.created",
        subjectKind: "programme",
        subjectId: programme.id,
        patientId: episode.patientId,
        siteId: episode.siteId,
        detail: input.copyOf === undefined ? {} : { copyOf: input.copyOf },
      });
      const loaded = await loadProgramme(tx, "clinical.write", programme.id);
      return programmeView(tx, loaded, await loadVersion(tx, programme.id, 1));
    }),
);

async function startingContent(
  tx: Context,
  episode: EpisodeRow,
  copyOf: string | undefined,
): Promise<Programme> {
  if (copyOf === undefined) return emptyProgramme;
  const { programme } = await loadProgramme(tx, "clinical.read", copyOf);
  // Another patient's exercises are as unknown here as a row that does not exist.
  if (programme.patientId !== episode.patientId) throw notFound("programme");
  return contentOf(await loadVersion(tx, programme.id, programme.currentVersion));
}

async function countOf(tx: Context, patientId: string): Promise<number> {
  const [row] = await tx.db
    .select({ programmes: count() })
    .from(programmes)
    .where(and(eq(programmes.practiceId, tx.practiceId), eq(programmes.patientId, patientId)));
  return row?.programmes ?? 0;
}

async function insertProgramme(tx: Context, episode: EpisodeRow, title: string, content: Programme) {
  const now = tx.clock.now();
  const key = { practiceId: tx.practiceId, id: newId() };
  await tx.db.insert(programmes).values({
    ...key,
    episodeId: episode.id,
    patientId: episode.patientId,
    title,
    createdAt: now,
    createdBy: tx.staffMemberId,
    updatedAt: now,
  });
  await tx.db.insert(programmeVersions).values({
    practiceId: tx.practiceId,
    programmeId: key.id,
    versionNumber: 1,
    content: { ...content },
    savedAt: now,
    savedBy: tx.staffMemberId,
  });
  return key;
}
