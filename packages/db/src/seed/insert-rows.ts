import { getTableColumns, getTableName } from "drizzle-orm";
import type { MySqlTable } from "drizzle-orm/mysql-core";
import type { Connection } from "mysql2/promise";

const rowsAtOnce = 2_000;

/**
 * Inserts rows in large statements, each value written as the table's column says. Made for thousands of rows,
 * where the query builder's checks would take longer than the database.
 * @param overwrite names of columns to write anew where the row is there already
 */
export async function insertRows<T extends MySqlTable>(
  connection: Connection,
  table: T,
  rows: readonly T["$inferInsert"][],
  overwrite: readonly (keyof T["$inferInsert"] & string)[] = [],
): Promise<void> {
  if (rows.length === 0) return;
  const all = getTableColumns(table);
  const used = Object.keys(all).filter((key) => rows.some((row) => read(row, key) !== undefined));
  const columns = used.map((key) => ({ key, column: columnOf(all, key) }));
  const names = columns.map(({ column }) => column.name);
  const renew = overwrite
    .map((key) => columnOf(all, key).name)
    .map((name) => `\`${name}\` = VALUES(\`${name}\`)`);
  const ending = renew.length === 0 ? "" : ` ON DUPLICATE KEY UPDATE ${renew.join(", ")}`;
  for (let from = 0; from < rows.length; from += rowsAtOnce) {
    const values = rows.slice(from, from + rowsAtOnce).map((row) =>
      columns.map(({ key, column }) => {
        const value = read(row, key);
        if (value === undefined) return column.default ?? null;
        return value === null ? null : column.mapToDriverValue(value);
      }),
    );
    await connection.query(`INSERT INTO ?? (??) VALUES ?${ending}`, [getTableName(table), names, values]);
  }
}

const read = (row: Record<string, unknown>, key: string): unknown => row[key];

function columnOf(all: ReturnType<typeof getTableColumns>, key: string) {
  const column = all[key];
  if (!column) throw new RangeError(`There is no column ${key}.`);
  return column;
}
