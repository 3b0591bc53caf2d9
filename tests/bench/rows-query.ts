import { dayBounds } from "@withy/core/zoned-time";
import { takenSql } from "@withy/services/diary/free-lanes";
import { MySqlDialect } from "drizzle-orm/mysql-core";
import { large, volumeId } from "./volume-plan";

/** The statement that reads what is taken at every site, as the search itself would for all those days. */
export function rowsQuery(firstDay: string, lastDay: string): { sql: string; values: unknown[] } {
  const many = <T>(count: number, one: (n: number) => T): T[] =>
    Array.from({ length: count }, (_, n) => one(n));
  const who = { practiceId: volumeId("practice", 1), roles: [{ role: "owner" as const, siteId: null }] };
  const scope = {
    siteIds: many(large.sites, (n) => volumeId("site", n)),
    therapistIds: many(large.therapists, (n) => volumeId("member", n)),
    movingId: null,
  };
  const [from, to] = [dayBounds(firstDay, "Europe/London").from, dayBounds(lastDay, "Europe/London").to];
  const { sql, params } = new MySqlDialect().sqlToQuery(takenSql(who, scope, from, to));
  return { sql, values: params };
}
