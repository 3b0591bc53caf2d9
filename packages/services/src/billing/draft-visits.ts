import { groupByDraft } from "@withy/billing/draft-groups";
import { isDuplicate } from "@withy/db/database-error";
import type { Context } from "../context";
import { inTransaction } from "../transaction";
import { loadPractice, type PracticeRow } from "./load-practice";
import type { PricedVisit } from "./visits-to-invoice";
import { type WrittenDrafts, writeDrafts } from "./write-drafts";

/** Enough that a round trip more or less does not count, few enough that others wait for no lock. */
const draftsAtOnce = 50;
const triesForOne = 3;

export interface Drafting extends WrittenDrafts {
  /** Visits that were looked at, those that somebody else drafted meanwhile included. */
  readonly visitsSeen: number;
}

export interface DraftingWatch {
  /** Called between two transactions; what it throws ends the drafting there. */
  between(): void;
  /** Called as the last thing inside each transaction with what will stand once it commits. */
  written(tx: Context, sofar: Drafting): Promise<void>;
}

type Groups = readonly (readonly PricedVisit[])[];

/** Puts visits on drafts, many drafts to one transaction. Twice at once does no harm: a visit stands on one line only. */
export async function draftVisits(
  ctx: Context,
  visits: readonly PricedVisit[],
  watch: DraftingWatch | null = null,
): Promise<Drafting> {
  const practice = await loadPractice(ctx);
  const groups = groupByDraft(visits);
  let sofar: Drafting = { invoiceIds: [], visitsDrafted: 0, visitsSeen: 0 };
  for (let at = 0; at < groups.length; at += draftsAtOnce) {
    watch?.between();
    sofar = await draftGroups(ctx, practice, groups.slice(at, at + draftsAtOnce), sofar, watch);
  }
  return sofar;
}

/**
 * One transaction for all the groups. Where somebody else is drafting one of the visits at this moment, each group
 * goes by itself, so that only that visit is left out.
 */
async function draftGroups(
  ctx: Context,
  practice: PracticeRow,
  groups: Groups,
  before: Drafting,
  watch: DraftingWatch | null,
): Promise<Drafting> {
  const visitsSeen = before.visitsSeen + groups.flat().length;
  for (let tries = 1; ; tries += 1) {
    try {
      return await inTransaction(ctx, async (tx) => {
        const { invoiceIds, visitsDrafted } = await writeDrafts(tx, practice, groups);
        const after = {
          invoiceIds: [...before.invoiceIds, ...invoiceIds],
          visitsDrafted: before.visitsDrafted + visitsDrafted,
          visitsSeen,
        };
        await watch?.written(tx, after);
        return after;
      });
    } catch (error) {
      if (!isDuplicate(error, "invoice_lines_visit_once")) throw error;
      if (groups.length > 1) break;
      // The next try sees the other one's line and leaves that visit out.
      if (tries === triesForOne) return { ...before, visitsSeen };
    }
  }
  let sofar = before;
  for (const group of groups) sofar = await draftGroups(ctx, practice, [group], sofar, watch);
  return sofar;
}
