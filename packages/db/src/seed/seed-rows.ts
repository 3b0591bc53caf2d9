import type { MySqlTable } from "drizzle-orm/mysql-core";
import type { Connection } from "mysql2/promise";
import { insertRows } from "./insert-rows";

/** Rows of a scenario, gathered in memory and written in the order in which their tables were first named. */
export class SeedRows {
  private readonly byTable = new Map<MySqlTable, Record<string, unknown>[]>();

  add<T extends MySqlTable>(table: T, ...rows: T["$inferInsert"][]): void {
    const gathered = this.byTable.get(table) ?? [];
    this.byTable.set(table, gathered);
    for (const row of rows) gathered.push(row);
  }

  of<T extends MySqlTable>(table: T): T["$inferInsert"][] {
    return (this.byTable.get(table) ?? []) as T["$inferInsert"][];
  }

  async write(connection: Connection): Promise<number> {
    let count = 0;
    for (const [table, rows] of this.byTable) {
      await insertRows(connection, table, rows);
      count += rows.length;
    }
    return count;
  }
}
