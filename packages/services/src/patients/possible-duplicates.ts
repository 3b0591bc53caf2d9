import type { DuplicateCandidate, PatientDetails } from "@withy/contracts/patients";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { patients } from "@withy/db/schema";
import { and, eq, type SQL } from "drizzle-orm";
import type { Context } from "../context";
import { rowColumns, toPatientRow } from "./patient-row";
import { reversedDigits } from "./search-columns";
import { areSimilarNames } from "./similar-names";

const shownAtMost = 5;

type Asked = Pick<PatientDetails, "givenName" | "familyName" | "bornOn" | "phone" | "nhsNumber">;

/**
 * Refuses as "possible-duplicate" where someone registered shares the date of birth and a similar name, the phone or
 * the NHS number. The screen shows them and may save again with "it is someone else".
 */
export async function refusePossibleDuplicate(ctx: Context, asked: Asked, exceptId?: string): Promise<void> {
  const candidates = await findPossibleDuplicates(ctx, asked, exceptId);
  if (candidates.length === 0) return;
  const message =
    candidates.length === 1
      ? "Someone like this is already registered. Open their record, or save this as someone else."
      : "People like this are already registered. Open a record, or save this as someone else.";
  throw refused(refusal("possible-duplicate", message), { candidates });
}

async function findPossibleDuplicates(
  ctx: Context,
  asked: Asked,
  exceptId?: string,
): Promise<DuplicateCandidate[]> {
  const phone = asked.phone === null ? null : reversedDigits(asked.phone);
  // One read for each index: asked together the server may walk the whole practice instead.
  const found = await Promise.all([
    alike(ctx, eq(patients.bornOn, asked.bornOn)),
    phone === null ? [] : alike(ctx, eq(patients.phoneReversed, phone)),
    asked.nhsNumber === null ? [] : alike(ctx, eq(patients.nhsNumber, asked.nhsNumber)),
  ]);
  const rows = new Map(found.flat().map((row) => [row.id, row]));
  if (exceptId !== undefined) rows.delete(exceptId);
  return [...rows.values()]
    .map((row) => ({ ...toPatientRow(row), reasons: reasonsFor(row, asked) }))
    .filter((candidate) => candidate.reasons.length > 0)
    .sort((a, b) => b.reasons.length - a.reasons.length || a.name.localeCompare(b.name))
    .slice(0, shownAtMost);
}

function alike(ctx: Context, where: SQL) {
  return ctx.db
    .select({ ...rowColumns, nhsNumber: patients.nhsNumber })
    .from(patients)
    .where(and(eq(patients.practiceId, ctx.practiceId), where));
}

function reasonsFor(
  row: Pick<typeof patients.$inferSelect, "givenName" | "familyName" | "bornOn" | "phone" | "nhsNumber">,
  asked: Asked,
): DuplicateCandidate["reasons"] {
  const reasons: DuplicateCandidate["reasons"][number][] = [];
  if (row.bornOn === asked.bornOn && areSimilarNames(row, asked)) reasons.push("born-and-name");
  if (asked.phone !== null && row.phone === asked.phone) reasons.push("phone");
  if (asked.nhsNumber !== null && row.nhsNumber === asked.nhsNumber) reasons.push("nhs-number");
  return reasons;
}
