import { placeWords } from "@withy/clinical/episodes/sides";
import type { LetterView } from "@withy/contracts/letters";
import { can } from "@withy/core/access/can";
import { patients, staffMembers } from "@withy/db/schema";
import { letterChecks } from "@withy/documents/letter/check-letter";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { listDeliveries } from "./letter-deliveries";
import { type LetterAtHand, letterTitles, recipientOf, sectionsOf } from "./letter-records";
import { loadLetterSender } from "./letter-sender";
import { letterState } from "./letter-state";

/** A letter with all that its page shows. Only a draft is held against the record; a signed one stands as it is. */
export async function letterView(ctx: Context, at: LetterAtHand): Promise<LetterView> {
  const { letter, episode } = at;
  const patient = await loadRecord(ctx, patients, letter.patientId, "patient");
  const author = await loadRecord(ctx, staffMembers, letter.authorId, "staff member");
  const authorName = `${author.givenName} ${author.familyName}`;
  const { zone, ...sender } = await loadLetterSender(ctx, episode.siteId);
  const isDraft = letter.state === "draft";
  const state = isDraft ? await letterState(ctx, at, authorName) : null;
  return {
    id: letter.id,
    title: letterTitles[letter.kind],
    reference: letter.reference,
    state: letter.state,
    version: letter.version,
    datedOn: letter.datedOn,
    zone,
    patient: {
      id: patient.id,
      name: `${patient.givenName} ${patient.familyName}`,
      bornOn: patient.bornOn,
      nhsNumber: patient.nhsNumber,
      addressLines: [...patient.addressLines, ...(patient.postcode ? [patient.postcode] : [])],
      email: patient.email,
    },
    episode: {
      id: episode.id,
      problem: episode.problem,
      place: placeWords(episode.region, episode.side),
      state: episode.state,
      version: episode.version,
    },
    author: { id: author.id, name: authorName, jobTitle: author.jobTitle },
    sender,
    recipient: recipientOf(letter),
    sections: sectionsOf(letter),
    stale: state?.stale ?? [],
    missing: state?.missing ?? [],
    checks: state ? letterChecks(state.toCheck) : [],
    canWrite: isDraft && letter.authorId === ctx.staffMemberId,
    canSend: !isDraft && can(ctx.roles, "letters.send", episode.siteId),
    updatedAt: letter.updatedAt.toISOString(),
    signedAt: letter.signedAt?.toISOString() ?? null,
    signedName: letter.signedName,
    registrationNumber: letter.registrationNumber,
    deliveries: await listDeliveries(ctx, letter.id),
  };
}
