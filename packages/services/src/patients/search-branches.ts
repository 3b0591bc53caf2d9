import { can, sitesWith } from "@withy/core/access/can";
import { invoices, patients } from "@withy/db/schema";
import { and, eq, inArray, like, or, type SQL, sql } from "drizzle-orm";
import type { MySqlColumn } from "drizzle-orm/mysql-core";
import type { Context } from "../context";
import type { SearchMeaning } from "./read-search";

/** One way to find patients: a range of one index, and the order in which that index gives them. */
export interface SearchBranch {
  where: SQL;
  sortBy: MySqlColumn;
}

/**
 * The ways in which a search may be meant, best first. Each reads one index inside the practice from its start, so
 * none grows with the number of patients who do not match.
 */
export function searchBranches(ctx: Context, meaning: SearchMeaning): SearchBranch[] {
  const sortBy = patients.nameLastFirst;
  const branches: (SearchBranch | null)[] = [
    meaning.nhsNumber === null ? null : { where: eq(patients.nhsNumber, meaning.nhsNumber), sortBy },
    meaning.bornOn === null
      ? null
      : { where: allOf(eq(patients.bornOn, meaning.bornOn), hasWords(meaning.words)), sortBy },
    meaning.phoneFromEnd === null
      ? null
      : { where: like(patients.phoneReversed, `${meaning.phoneFromEnd}%`), sortBy: patients.phoneReversed },
    meaning.invoiceNumber === null ? null : invoiceBranch(ctx, meaning.invoiceNumber),
    ...(meaning.bornOn === null ? nameBranches(meaning.words) : []),
  ];
  return branches.filter((branch) => branch !== null);
}

function nameBranches(words: readonly string[]): SearchBranch[] {
  if (words.length === 0) return [];
  const typed = words.join(" ");
  const straight = [
    { where: like(patients.nameLastFirst, `${typed}%`), sortBy: patients.nameLastFirst },
    { where: like(patients.nameFirstLast, `${typed}%`), sortBy: patients.nameFirstLast },
  ];
  if (words.length === 1) return straight;
  // A single letter is too wide a start by itself: "o dalaigh" starts with both words.
  const starts = words.map((word, i) => (word.length === 1 ? `${word} ${words[i + 1] ?? ""}`.trim() : word));
  const leads = starts.filter((start) => start.length > 1);
  const anyLead = or(...(leads.length > 0 ? leads : words).map((w) => like(patients.nameLastFirst, `${w}%`)));
  return [...straight, { where: allOf(anyLead, hasWords(words)), sortBy: patients.nameLastFirst }];
}

/** Every word starts a word of the name, in any order. */
function hasWords(words: readonly string[]): SQL | undefined {
  return and(...words.map((word) => sql`concat(' ', ${patients.nameLastFirst}) like ${`% ${word}%`}`));
}

function invoiceBranch(ctx: Context, number: number): SearchBranch | null {
  if (!can(ctx.roles, "billing.read")) return null;
  const sites = sitesWith(ctx.roles, "billing.read");
  const found = ctx.db
    .select({ id: invoices.patientId })
    .from(invoices)
    .where(
      and(
        eq(invoices.practiceId, ctx.practiceId),
        eq(invoices.number, number),
        sites === "all" ? undefined : inArray(invoices.siteId, sites),
      ),
    );
  return { where: inArray(patients.id, found), sortBy: patients.nameLastFirst };
}

function allOf(...conditions: (SQL | undefined)[]): SQL {
  return and(...conditions) ?? sql`true`;
}
