import { type ProgrammeView, programmeVersionInput } from "@withy/contracts/programmes";
import { recordAudit } from "../../audit";
import { verb } from "../../verb";
import { loadProgramme, loadVersion } from "./programme-records";
import { programmeView } from "./programme-view";

/** A programme as it stands, or at an earlier version. */
export const getProgramme = verb(
  "clinical.read",
  programmeVersionInput,
  async (ctx, input): Promise<ProgrammeView> => {
    const loaded = await loadProgramme(ctx, "clinical.read", input.programmeId);
    const { programme, episode } = loaded;
    const shown = await loadVersion(ctx, programme.id, input.versionNumber ?? programme.currentVersion);
    const view = await programmeView(ctx, loaded, shown);
    await recordAudit(ctx, {
      action: "programme.read",
      subjectKind: "programme",
      subjectId: programme.id,
      patientId: programme.patientId,
      siteId: episode.siteId,
      detail: { versionNumber: shown.versionNumber },
    });
    return view;
  },
);
