import { makeCalendarFeedInput, type NewCalendarFeedView } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { calendarFeeds, staffMembers } from "@withy/db/schema";
import { recordAudit } from "../audit";
import { loadRecord } from "../load-record";
import { hashSecretToken, newSecretToken } from "../secret-token";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { calendarFeedView, endMyCalendarFeeds } from "./my-calendar-feed";

const onlyTherapists = refusal(
  "no-therapist",
  "A calendar feed holds a therapist's visits, so only therapists have one. Use the diary to see a day.",
);

/**
 * Makes the address of one's own calendar feed; the one before it stops at once. No idempotency key: its stored
 * answer would keep the secret, and a repeat only makes a newer address.
 */
export const makeCalendarFeed = verb(
  "account.own",
  makeCalendarFeedInput,
  async (ctx): Promise<NewCalendarFeedView> => {
    const token = newSecretToken();
    return inTransaction(ctx, async (tx) => {
      // Locked, so that two browsers at once leave one live address.
      const member = await loadRecord(tx, staffMembers, tx.staffMemberId, "colleague", { lock: true });
      refuseIf(member.isTherapist ? null : onlyTherapists);
      const ended = await endMyCalendarFeeds(tx);
      const row = {
        practiceId: tx.practiceId,
        id: newId(),
        staffMemberId: tx.staffMemberId,
        tokenHash: hashSecretToken(token),
        createdAt: tx.clock.now(),
        lastReadAt: null,
        revokedAt: null,
      };
      await tx.db.insert(calendarFeeds).values(row);
      await recordAudit(tx, {
        action: "calendar-feed.made",
        subjectKind: "calendar-feed",
        subjectId: row.id,
        detail: { ended },
      });
      return { path: `/api/feeds/${token}.ics`, feed: calendarFeedView(tx, row) };
    });
  },
);
