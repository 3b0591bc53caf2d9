import { z } from "zod";
import { pageFields } from "../fields";
import type { Page } from "../page";

/** One box for everything: names in any order, date of birth, phone, NHS number, invoice number. */
export const listPatientsInput = z.strictObject({
  search: z.string().trim().max(100, "Use 100 characters or fewer.").default(""),
  /** Whether all matches are counted, for a list with pages; a field that finds as one types needs the best few. */
  withTotal: z.union([z.boolean(), z.stringbool()]).default(false),
  ...pageFields,
});
export type ListPatientsInput = z.input<typeof listPatientsInput>;

/** One patient in a list or a search. */
export interface PatientRow {
  readonly id: string;
  /** "Eleri Tamworth", as it is read out. */
  readonly name: string;
  readonly preferredName: string | null;
  readonly bornOn: string;
  /** As it is read out at home: "07700 900731". */
  readonly phone: string | null;
  readonly postcode: string | null;
}

export interface PatientPage extends Page<PatientRow> {
  /** More match than `total` says, which is as far as they were counted. */
  readonly isCutShort: boolean;
}

/** Someone already registered who may be the person at the desk. */
export interface DuplicateCandidate extends PatientRow {
  readonly reasons: readonly ("born-and-name" | "phone" | "nhs-number")[];
}

/** What the refusal "possible-duplicate" carries in `problem.more`. */
export interface PossibleDuplicateDetail {
  readonly candidates: readonly DuplicateCandidate[];
}
