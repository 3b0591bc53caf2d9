import {
  MySqlDialect,
  type MySqlPreparedQueryConfig,
  type MySqlTransactionConfig,
  type PreparedQueryKind,
} from "drizzle-orm/mysql-core";
import {
  MySql2Database,
  type MySql2PreparedQueryHKT,
  MySql2Session,
  type MySql2Transaction,
} from "drizzle-orm/mysql2";
import type { Pool, PoolConnection } from "mysql2/promise";
import { unwrapDatabaseError } from "./database-error";

type NoSchema = Record<string, never>;
type Prepare = MySql2Session<NoSchema, NoSchema>["prepareQuery"];

const dialect = new MySqlDialect();

const throwQuietly = (error: unknown): never => {
  throw unwrapDatabaseError(error);
};

/** Runs statements as the query builder's own session does, but a failed one tells neither its text nor its values. */
class QuietSession extends MySql2Session<NoSchema, NoSchema> {
  constructor(private readonly source: Pool | PoolConnection) {
    super(source, dialect, undefined, { mode: "default" });
  }

  override prepareQuery<T extends MySqlPreparedQueryConfig>(
    ...given: Parameters<Prepare>
  ): PreparedQueryKind<MySql2PreparedQueryHKT, T> {
    const prepared = super.prepareQuery<T>(...given);
    const execute = prepared.execute.bind(prepared);
    prepared.execute = (values) => execute(values).catch(throwQuietly);
    return prepared;
  }

  override async transaction<T>(
    work: (tx: MySql2Transaction<NoSchema, NoSchema>) => Promise<T>,
    config?: MySqlTransactionConfig,
  ): Promise<T> {
    if (!("getConnection" in this.source)) return super.transaction(work, config);
    const connection = await this.source.getConnection().catch(throwQuietly);
    try {
      return await new QuietSession(connection).transaction(work, config);
    } finally {
      connection.release();
    }
  }
}

/** The query builder on a pool; every failure of the database comes out of it as a `DatabaseError`. */
export function openDatabase(pool: Pool): MySql2Database<NoSchema> {
  return new MySql2Database(dialect, new QuietSession(pool), undefined, "default");
}
