import {
  listPutAsideInput,
  type PutAsideItem,
  putAsideInput,
  removePutAsideInput,
} from "@withy/contracts/diary";
import { notFound, refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { timeOf } from "@withy/core/zoned-time";
import { patients, putAsideItems } from "@withy/db/schema";
import { and, desc, eq, inArray } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { inTransaction } from "../../transaction";
import { verb } from "../../verb";

/** A tray and no archive. */
const mostItems = 20;

type Row = typeof putAsideItems.$inferSelect;

/** One's own item; another person's is not there. */
async function loadOwn(ctx: Context, itemId: string): Promise<Row> {
  const row = await loadRecord(ctx, putAsideItems, itemId, "item", { lock: true });
  if (row.staffMemberId !== ctx.staffMemberId) throw notFound("item");
  return row;
}

/** Lays half-made work in one's own tray at an interruption, or back into it. */
export const putAside = verb("diary.book", putAsideInput, (ctx, input) =>
  inTransaction(ctx, async (tx) => {
    if (input.patientId !== null) await loadRecord(tx, patients, input.patientId, "patient");
    const before = input.itemId === null ? null : await loadOwn(tx, input.itemId);
    if (before === null) {
      const held = await tx.db.$count(
        putAsideItems,
        and(eq(putAsideItems.practiceId, tx.practiceId), eq(putAsideItems.staffMemberId, tx.staffMemberId)),
      );
      if (held >= mostItems)
        throw refused(refusal("tray-full", "Your tray is full. Take something up or remove it first."));
    }
    const id = before?.id ?? newId();
    const values = {
      kind: input.kind,
      title: input.title,
      typed: { patientId: input.patientId, fields: input.typed },
      putAsideAt: tx.clock.now(),
    };
    if (before === null)
      await tx.db
        .insert(putAsideItems)
        .values({ practiceId: tx.practiceId, id, staffMemberId: tx.staffMemberId, ...values });
    else
      await tx.db
        .update(putAsideItems)
        .set(values)
        .where(and(eq(putAsideItems.practiceId, tx.practiceId), eq(putAsideItems.id, id)));
    await recordAudit(tx, {
      action: "tray.put-aside",
      subjectKind: "put-aside-item",
      subjectId: id,
      patientId: input.patientId,
      detail: { kind: input.kind },
    });
    return { id, time: timeOf(tx.clock.now(), tx.zone) };
  }),
);

/** What lies in one's own tray, the last first. */
export const listPutAside = verb("diary.read", listPutAsideInput, async (ctx): Promise<PutAsideItem[]> => {
  const rows = await ctx.db
    .select()
    .from(putAsideItems)
    .where(
      and(
        eq(putAsideItems.practiceId, ctx.practiceId),
        eq(putAsideItems.staffMemberId, ctx.staffMemberId),
        inArray(putAsideItems.kind, ["booking", "finding"]),
      ),
    )
    .orderBy(desc(putAsideItems.putAsideAt), desc(putAsideItems.id))
    .limit(mostItems);
  const named = rows.flatMap((row) => (typeof row.typed.patientId === "string" ? [row.typed.patientId] : []));
  const people = named.length === 0 ? [] : await readPeople(ctx, named);
  return rows.map((row) => {
    const person = people.find((one) => one.id === row.typed.patientId);
    return {
      id: row.id,
      kind: row.kind === "finding" ? "finding" : "booking",
      title: row.title,
      patient: person
        ? { id: person.id, name: `${person.givenName} ${person.familyName}`, bornOn: person.bornOn }
        : null,
      typed: row.typed.fields as PutAsideItem["typed"],
      time: timeOf(row.putAsideAt, ctx.zone),
      putAsideAt: row.putAsideAt.toISOString(),
    };
  });
});

const readPeople = (ctx: Context, ids: readonly string[]) =>
  ctx.db
    .select({
      id: patients.id,
      givenName: patients.givenName,
      familyName: patients.familyName,
      bornOn: patients.bornOn,
    })
    .from(patients)
    .where(and(eq(patients.practiceId, ctx.practiceId), inArray(patients.id, [...ids])));

/** Takes something out of one's tray: it was finished, or is not wanted any more. */
export const removePutAside = verb("diary.book", removePutAsideInput, (ctx, input) =>
  inTransaction(ctx, async (tx) => {
    const row = await loadOwn(tx, input.itemId);
    await tx.db
      .delete(putAsideItems)
      .where(and(eq(putAsideItems.practiceId, tx.practiceId), eq(putAsideItems.id, row.id)));
    await recordAudit(tx, {
      action: "tray.removed",
      subjectKind: "put-aside-item",
      subjectId: row.id,
      detail: { kind: row.kind },
    });
    return { id: row.id };
  }),
);
