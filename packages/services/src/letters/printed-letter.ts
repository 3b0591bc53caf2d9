import { episodes, letterDeliveries, letters, patients, practices, staffMembers } from "@withy/db/schema";
import { type PrintedLetter, renderLetterPdf } from "@withy/documents/letter/letter-pdf";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { type LetterRow, letterTitles, recipientOf, sectionsOf } from "./letter-records";
import { loadLetterSender } from "./letter-sender";

export interface RenderedLetter {
  readonly filename: string;
  readonly bytes: Buffer;
}

type Reader = Pick<Context, "db" | "practiceId">;

async function printedLetter(ctx: Reader, letter: LetterRow): Promise<PrintedLetter> {
  const episode = await loadRecord(ctx, episodes, letter.episodeId, "letter");
  const patient = await loadRecord(ctx, patients, letter.patientId, "patient");
  const author = await loadRecord(ctx, staffMembers, letter.authorId, "staff member");
  const { zone: _, ...sender } = await loadLetterSender(ctx, episode.siteId);
  const isSigned = letter.state === "signed";
  return {
    sender,
    title: letterTitles[letter.kind],
    reference: letter.reference,
    datedOn: letter.datedOn,
    recipient: recipientOf(letter),
    patient: {
      name: `${patient.givenName} ${patient.familyName}`,
      bornOn: patient.bornOn,
      nhsNumber: patient.nhsNumber,
      addressLines: [...patient.addressLines, ...(patient.postcode ? [patient.postcode] : [])],
    },
    sections: sectionsOf(letter),
    author: {
      name: letter.signedName ?? `${author.givenName} ${author.familyName}`,
      jobTitle: author.jobTitle,
      registrationNumber: isSigned ? letter.registrationNumber : author.registrationNumber,
    },
    signedOn: isSigned ? letter.datedOn : null,
    copies: [],
    at: letter.signedAt ?? letter.updatedAt,
  };
}

/** The letter as a file. A signed one gives the same bytes again, as long as the patient lives at the same address. */
export async function renderLetter(ctx: Reader, letter: LetterRow): Promise<RenderedLetter> {
  const bytes = await renderLetterPdf(await printedLetter(ctx, letter));
  return { filename: `letter-${letter.reference}.pdf`, bytes };
}

export interface LinkedLetter {
  readonly delivery: typeof letterDeliveries.$inferSelect;
  readonly letter: LetterRow;
  /** The practice's zone. */
  readonly zone: string;
  /** The patient's date of birth, which the reader must know. */
  readonly bornOn: string;
}

/** The letter of a delivery whose link has not run out; null for any other. */
export async function findLinkedLetter(
  ctx: Pick<Context, "db" | "clock">,
  tokenHash: string,
): Promise<LinkedLetter | null> {
  const [row] = await ctx.db
    .select({ delivery: letterDeliveries, letter: letters, zone: practices.zone, bornOn: patients.bornOn })
    .from(letterDeliveries)
    .innerJoin(
      letters,
      and(eq(letters.practiceId, letterDeliveries.practiceId), eq(letters.id, letterDeliveries.letterId)),
    )
    .innerJoin(patients, and(eq(patients.practiceId, letters.practiceId), eq(patients.id, letters.patientId)))
    .innerJoin(practices, eq(practices.id, letters.practiceId))
    .where(eq(letterDeliveries.tokenHash, tokenHash))
    .limit(1);
  if (!row?.delivery.expiresAt || row.delivery.expiresAt <= ctx.clock.now()) return null;
  return row;
}
