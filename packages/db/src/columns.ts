import { bigint, customType, date, datetime, varchar } from "drizzle-orm/mysql-core";

/** MariaDB's own UUID type: 16 bytes, in the order of the text, so version 7 ids stay in time order. */
export const uuid = customType<{ data: string; driverData: string }>({ dataType: () => "uuid" });

/** The hash of a secret: 32 bytes. */
export const sha256 = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => "binary(32)" });

/** An instant in UTC, to the millisecond. */
export const instant = (name: string) => datetime(name, { mode: "date", fsp: 3 });

/** A calendar date with no time and no zone. */
export const plainDate = (name: string) => date(name, { mode: "string" });

/** A wall-clock time "HH:MM" in the site's zone. */
export const clockTime = (name: string) => varchar(name, { length: 5 });

/** Whole pence, guarded to safe integers by the money functions. */
export const pence = (name: string) => bigint(name, { mode: "number" });

/** The two columns that open every table of a practice; together they are its primary key. */
export const tenantKey = () => ({ practiceId: uuid("practice_id").notNull(), id: uuid("id").notNull() });
