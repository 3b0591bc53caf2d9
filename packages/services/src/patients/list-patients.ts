import { listPatientsInput, type PatientPage } from "@withy/contracts/patients";
import { dayOf } from "@withy/core/zoned-time";
import { patients } from "@withy/db/schema";
import { and, asc, eq, type SQL, sql } from "drizzle-orm";
import { unionAll } from "drizzle-orm/mysql-core";
import type { Context } from "../context";
import { verb } from "../verb";
import { rowColumns, toPatientRow } from "./patient-row";
import { readSearch } from "./read-search";
import { type SearchBranch, searchBranches } from "./search-branches";

/** Rows beyond this are not counted: nobody pages that far, and counting them would cost more than finding. */
const countedAtMost = 1000;

/** The patients who match what was typed, best first; everyone in name order where nothing was. */
export const listPatients = verb(
  "patients.read",
  listPatientsInput,
  async (ctx, { search, page, pageSize, withTotal }): Promise<PatientPage> => {
    const branches = search === "" ? [everyone] : searchBranches(ctx, readSearch(search, todayOf(ctx)));
    const first = (page - 1) * pageSize;
    const found = first >= countedAtMost ? [] : await findRows(ctx, branches, first, pageSize + 1);
    const rows = found.slice(0, pageSize).map(toPatientRow);
    const known = first + rows.length;
    if (found.length <= pageSize) return { rows, page, pageSize, total: known, isCutShort: false };
    if (!withTotal) return { rows, page, pageSize, total: known, isCutShort: true };
    const counted = await countRows(ctx, branches);
    const total = Math.min(counted, countedAtMost);
    return { rows, page, pageSize, total, isCutShort: counted > countedAtMost };
  },
);

const everyone: SearchBranch = { where: sql`true`, sortBy: patients.nameLastFirst };

const todayOf = (ctx: Context) => dayOf(ctx.clock.now(), ctx.zone);

async function findRows(ctx: Context, branches: SearchBranch[], first: number, size: number) {
  const query = ({ where, sortBy }: SearchBranch, rank: number, limit: number, offset: number) =>
    ctx.db
      .select({
        ...rowColumns,
        rank: sql<number>`${rank}`.as("rank"),
        sortName: sql`${sortBy}`.as("sort_name"),
      })
      .from(patients)
      .where(branchWhere(ctx, branches, rank, where))
      .orderBy(asc(sortBy), asc(patients.id))
      .limit(limit)
      .offset(offset);
  const [only, another, ...rest] = branches;
  if (!only) return [];
  if (!another) return query(only, 0, size, first);
  return unionAll(
    query(only, 0, first + size, 0),
    query(another, 1, first + size, 0),
    ...rest.map((branch, i) => query(branch, i + 2, first + size, 0)),
  )
    .orderBy(sql`${sql.identifier("rank")}, ${sql.identifier("sort_name")}, ${sql.identifier("id")}`)
    .limit(size)
    .offset(first);
}

async function countRows(ctx: Context, branches: SearchBranch[]): Promise<number> {
  let counted = 0;
  for (const [rank, { where }] of branches.entries()) {
    const some = ctx.db
      .select({ id: patients.id })
      .from(patients)
      .where(branchWhere(ctx, branches, rank, where))
      .limit(countedAtMost + 1 - counted)
      .as("some");
    const [row] = await ctx.db.select({ n: sql<number>`count(*)`.mapWith(Number) }).from(some);
    counted += row?.n ?? 0;
    if (counted > countedAtMost) break;
  }
  return counted;
}

/** A branch without what the branches before it have given already, so that nobody is listed twice. */
function branchWhere(ctx: Context, branches: SearchBranch[], rank: number, where: SQL): SQL | undefined {
  const earlier = branches.slice(0, rank).map((branch) => sql`(${branch.where}) is not true`);
  return and(eq(patients.practiceId, ctx.practiceId), where, ...earlier);
}
