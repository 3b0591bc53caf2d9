import { handout } from "@withy/clinical/programmes/handout";
import { programmeVersionInput } from "@withy/contracts/programmes";
import { formatPhone } from "@withy/core/identifiers/phone";
import { dayOf } from "@withy/core/zoned-time";
import { sites, staffMembers } from "@withy/db/schema";
import { handoutPdf } from "@withy/documents/handout/handout-pdf";
import { recordAudit } from "../../audit";
import { loadRecord } from "../../load-record";
import { verb } from "../../verb";
import { loadProgramme, loadVersion } from "./programme-records";
import { programmeView } from "./programme-view";

export interface RenderedHandout {
  readonly fileName: string;
  readonly bytes: Buffer;
}

/** The handout of one version as a PDF. A version that was never given out says that it is a draft. */
export const renderHandout = verb(
  "clinical.read",
  programmeVersionInput,
  async (ctx, input): Promise<RenderedHandout> => {
    const loaded = await loadProgramme(ctx, "clinical.read", input.programmeId);
    const { programme, episode } = loaded;
    const shown = await loadVersion(ctx, programme.id, input.versionNumber ?? programme.currentVersion);
    const view = await programmeView(ctx, loaded, shown);
    const site = await loadRecord(ctx, sites, episode.siteId, "site");
    const author = await loadRecord(ctx, staffMembers, shown.issuedBy ?? shown.savedBy, "staff member");
    const at = shown.issuedAt ?? shown.savedAt;
    const bytes = await handoutPdf({
      sender: {
        practice: view.sender.practice,
        siteLine: [site.name, ...site.addressLines, site.postcode].join(", "),
        contactLine: formatPhone(site.phone),
      },
      handout: handout(view.content, view.calledName),
      patientName: view.patient.name,
      bornOn: view.patient.bornOn,
      author: { name: `${author.givenName} ${author.familyName}`, jobTitle: author.jobTitle },
      datedOn: dayOf(at, site.zone),
      versionNumber: shown.versionNumber,
      isDraft: shown.issuedAt === null,
      at,
    });
    await recordAudit(ctx, {
      action: "programme.printed",
      subjectKind: "programme",
      subjectId: programme.id,
      patientId: programme.patientId,
      siteId: episode.siteId,
      detail: { versionNumber: shown.versionNumber },
    });
    return { fileName: `exercises-version-${shown.versionNumber}.pdf`, bytes };
  },
);
