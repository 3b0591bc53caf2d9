import { checkIssue } from "@withy/clinical/programmes/check-programme";
import { issueProgrammeInput, type ProgrammeView } from "@withy/contracts/programmes";
import { refuseIf, stale } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { programmes, programmeVersions } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../../audit";
import { once } from "../../once";
import { verb } from "../../verb";
import { contentOf, loadProgramme, loadVersion } from "./programme-records";
import { programmeView } from "./programme-view";
import { requireOpenEpisode } from "./require-open-episode";

/** Gives the current version to the patient. From then on the database lets nobody change it. */
export const issueProgramme = verb(
  "clinical.write",
  issueProgrammeInput,
  async (ctx, input): Promise<ProgrammeView> =>
    once(ctx, "programme.issue", async (tx) => {
      const { programme, episode } = await loadProgramme(tx, "clinical.write", input.programmeId, {
        lock: true,
      });
      requireOpenEpisode(episode);
      if (programme.version !== input.version) throw stale("programme", { version: programme.version });
      const current = await loadVersion(tx, programme.id, programme.currentVersion);
      const already = `Version ${current.versionNumber} was given out already. Change something to begin the next one.`;
      refuseIf(current.issuedAt === null ? null : refusal("already-issued", already));
      refuseIf(checkIssue(contentOf(current)));
      const now = tx.clock.now();
      await tx.db
        .update(programmeVersions)
        .set({ issuedAt: now, issuedBy: tx.staffMemberId })
        .where(
          and(
            eq(programmeVersions.practiceId, tx.practiceId),
            eq(programmeVersions.programmeId, programme.id),
            eq(programmeVersions.versionNumber, current.versionNumber),
          ),
        );
      await tx.db
        .update(programmes)
        .set({ version: programme.version + 1, updatedAt: now })
        .where(and(eq(programmes.practiceId, tx.practiceId), eq(programmes.id, programme.id)));
      await recordAudit(tx, {
        action: "programme.issued",
        subjectKind: "programme",
        subjectId: programme.id,
        patientId: programme.patientId,
        siteId: episode.siteId,
        detail: { versionNumber: current.versionNumber },
      });
      const loaded = await loadProgramme(tx, "clinical.write", programme.id);
      return programmeView(tx, loaded, await loadVersion(tx, programme.id, current.versionNumber));
    }),
);
