import { inspect } from "node:util";
import { newId } from "@withy/core/ids";
import { connect } from "@withy/db/client";
import { DatabaseError, isDuplicate } from "@withy/db/database-error";
import { patients, requestLimits } from "@withy/db/schema";
import { runInTransaction } from "@withy/db/transaction";
import { eq, sql } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { testConnection } from "../support/connection";

const secret = "Tamworth walks with a stick";
const { db } = testConnection();

/** What a failed statement throws, and every word that a log could make of it, hidden properties too. */
async function failureOf(work: Promise<unknown>) {
  const error: unknown = await work.then(
    () => new Error("Nothing failed."),
    (thrown: unknown) => thrown,
  );
  const told = `${String(error)} ${JSON.stringify(error)} ${inspect(error, { depth: 9, showHidden: true })}`;
  return { error, told };
}

const unknownColumn = sql`select nowhere from patients where family_name = ${secret}`;

describe("a failed statement tells neither its text nor its values", () => {
  it.each([
    ["on its own", () => db.execute(unknownColumn)],
    ["in a transaction", () => runInTransaction(db, (tx) => tx.execute(unknownColumn))],
    [
      "in a nested one",
      () => db.transaction((tx) => tx.transaction((inner) => inner.execute(unknownColumn))),
    ],
    ["as a count", () => db.$count(patients, sql`nowhere = ${secret}`)],
    [
      "as a built query",
      () => db.select({ nowhere: sql`nowhere` }).from(patients).where(eq(patients.familyName, secret)),
    ],
  ])("%s", async (_, work) => {
    const { error, told } = await failureOf(work());
    expect(error).toBeInstanceOf(DatabaseError);
    expect(error).toMatchObject({ errno: 1054, key: null });
    expect(told).not.toContain(secret);
    expect(told).not.toContain("family_name");
  });

  it("names the key of a duplicate outside a transaction, never its value", async () => {
    const row = { key: `${secret} ${newId()}`.slice(0, 60), points: 1, expire: 1 };
    await db.insert(requestLimits).values(row);
    const { error, told } = await failureOf(db.insert(requestLimits).values(row));
    expect(isDuplicate(error, "PRIMARY")).toBe(true);
    expect(told).not.toContain(secret);
  });

  it("says that the database is out of reach where nobody answers", async () => {
    const nobody = connect("mysql://withy_app:x@127.0.0.1:1/withy");
    const { error, told } = await failureOf(nobody.db.execute(unknownColumn));
    expect(error).toMatchObject({ name: "DatabaseError", errno: 0 });
    expect(String(error)).toContain("ECONNREFUSED");
    expect(told).not.toContain(secret);
    await nobody.close();
    const closed = await failureOf(nobody.db.execute(unknownColumn));
    expect(closed.error).toBeInstanceOf(DatabaseError);
    expect(closed.told).not.toContain(secret);
  });
});
