import { type SQL, sql } from "drizzle-orm";

/** The id of the latest change at each site. Each site's end of the index is read on its own: one row each. */
export function latestChangesSql(practiceId: string, siteIds: readonly string[]): SQL {
  const ends = siteIds.map(
    (
      id,
    ) => sql`(select c.id from appointment_changes c where c.practice_id = ${practiceId} and c.site_id = ${id}
      order by c.changed_at desc, c.id desc limit 1)`,
  );
  return sql.join(ends, sql` union all `);
}

/** Ids are made in order of time, so the greater is the later. */
export const laterChange = (a: string | null, b: string): string => (a === null || b > a ? b : a);
