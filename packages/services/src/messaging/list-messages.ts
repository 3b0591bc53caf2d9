import {
  listMessagesInput,
  type MessageCounts,
  type MessageRow,
  type MessageState,
} from "@withy/contracts/messaging";
import type { Page } from "@withy/contracts/page";
import { can } from "@withy/core/access/can";
import { outboxMessages, patients } from "@withy/db/schema";
import { and, count, desc, eq, inArray } from "drizzle-orm";
import { z } from "zod";
import { verb } from "../verb";
import { messageRow } from "./message-row";

const statesOf: Record<"waiting" | "sent" | "failed", MessageState[]> = {
  waiting: ["waiting", "claimed"],
  sent: ["sent"],
  failed: ["failed"],
};

/** What went out of this practice, what waits and what did not go, newest first. No text of any message is in it. */
export const listMessages = verb(
  "messaging.read",
  listMessagesInput,
  async (ctx, input): Promise<Page<MessageRow>> => {
    const where = and(
      eq(outboxMessages.practiceId, ctx.practiceId),
      input.state === "all" ? undefined : inArray(outboxMessages.state, statesOf[input.state]),
      input.patientId === undefined ? undefined : eq(outboxMessages.patientId, input.patientId),
    );
    const [counted] = await ctx.db.select({ total: count() }).from(outboxMessages).where(where);
    const rows = await ctx.db
      .select({ message: outboxMessages, givenName: patients.givenName, familyName: patients.familyName })
      .from(outboxMessages)
      .leftJoin(
        patients,
        and(eq(patients.practiceId, outboxMessages.practiceId), eq(patients.id, outboxMessages.patientId)),
      )
      .where(where)
      .orderBy(desc(outboxMessages.createdAt), desc(outboxMessages.id))
      .limit(input.pageSize)
      .offset((input.page - 1) * input.pageSize);
    const maySend = can(ctx.roles, "messaging.send");
    return {
      rows: rows.flatMap(({ message, givenName, familyName }) => {
        const name = givenName === null ? null : `${givenName} ${familyName}`;
        return messageRow(message, name, maySend) ?? [];
      }),
      page: input.page,
      pageSize: input.pageSize,
      total: counted?.total ?? 0,
    };
  },
);

/** How many wait and how many did not go. */
export const countMessages = verb(
  "messaging.read",
  z.strictObject({}),
  async (ctx): Promise<MessageCounts> => {
    const rows = await ctx.db
      .select({ state: outboxMessages.state, n: count() })
      .from(outboxMessages)
      .where(
        and(
          eq(outboxMessages.practiceId, ctx.practiceId),
          inArray(outboxMessages.state, ["waiting", "claimed", "failed"]),
        ),
      )
      .groupBy(outboxMessages.state);
    const of = (...states: MessageState[]) =>
      rows.filter((row) => states.includes(row.state)).reduce((sum, row) => sum + row.n, 0);
    return { waiting: of("waiting", "claimed"), failed: of("failed") };
  },
);
