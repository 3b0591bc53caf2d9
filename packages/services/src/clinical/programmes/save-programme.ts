import { checkProgramme } from "@withy/clinical/programmes/check-programme";
import type { Programme } from "@withy/clinical/programmes/programme";
import { type ProgrammeView, saveProgrammeInput } from "@withy/contracts/programmes";
import { refuseIf, stale } from "@withy/core/errors";
import { programmes, programmeVersions } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { inTransaction } from "../../transaction";
import { verb } from "../../verb";
import { loadProgramme, loadVersion, type ProgrammeRow, type ProgrammeVersionRow } from "./programme-records";
import { programmeView } from "./programme-view";
import { requireOpenEpisode } from "./require-open-episode";

/**
 * Saves a programme. A version that the patient holds is never touched: the first change after it begins the next
 * version, and later saves go on in that one until it is given out in turn.
 */
export const saveProgramme = verb(
  "clinical.write",
  saveProgrammeInput,
  async (ctx, input): Promise<ProgrammeView> =>
    inTransaction(ctx, async (tx) => {
      const { programme, episode } = await loadProgramme(tx, "clinical.write", input.programmeId, {
        lock: true,
      });
      requireOpenEpisode(episode);
      const current = await loadVersion(tx, programme.id, programme.currentVersion);
      if (programme.version !== input.version)
        throw stale("programme", { theirs: current.content, version: programme.version });
      refuseIf(checkProgramme(input.content));
      const versionNumber = await writeContent(tx, programme, current, input.content);
      await tx.db
        .update(programmes)
        .set({
          title: input.title,
          currentVersion: versionNumber,
          version: programme.version + 1,
          updatedAt: tx.clock.now(),
        })
        .where(and(eq(programmes.practiceId, tx.practiceId), eq(programmes.id, programme.id)));
      await recordAudit(tx, {
        action: "programme.saved",
        subjectKind: "programme",
        subjectId: programme.id,
        patientId: programme.patientId,
        siteId: episode.siteId,
        detail: { versionNumber, exercises: input.content.items.length },
      });
      const loaded = await loadProgramme(tx, "clinical.write", programme.id);
      return programmeView(tx, loaded, await loadVersion(tx, programme.id, versionNumber));
    }),
);

async function writeContent(
  tx: Context,
  programme: ProgrammeRow,
  current: ProgrammeVersionRow,
  content: Programme,
): Promise<number> {
  const saved = { content: { ...content }, savedAt: tx.clock.now(), savedBy: tx.staffMemberId };
  if (current.issuedAt === null) {
    await tx.db
      .update(programmeVersions)
      .set(saved)
      .where(
        and(
          eq(programmeVersions.practiceId, tx.practiceId),
          eq(programmeVersions.programmeId, programme.id),
          eq(programmeVersions.versionNumber, current.versionNumber),
        ),
      );
    return current.versionNumber;
  }
  const versionNumber = current.versionNumber + 1;
  await tx.db
    .insert(programmeVersions)
    .values({ practiceId: tx.practiceId, programmeId: programme.id, versionNumber, ...saved });
  return versionNumber;
}
