import { type MyCalendarFeedView, revokeCalendarFeedInput } from "@withy/contracts/diary";
import { notFound } from "@withy/core/errors";
import { recordAudits } from "../audit/record-audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { endMyCalendarFeeds, readMyCalendarFeed } from "./my-calendar-feed";

/** Ends the address of one's own calendar feed: from now on it answers as if it had never been. */
export const revokeCalendarFeed = verb(
  "account.own",
  revokeCalendarFeedInput,
  (ctx): Promise<MyCalendarFeedView> =>
    inTransaction(ctx, async (tx) => {
      const ended = await endMyCalendarFeeds(tx);
      if (ended.length === 0) throw notFound("calendar feed");
      const about = { action: "calendar-feed.revoked", subjectKind: "calendar-feed" };
      await recordAudits(
        tx,
        ended.map((subjectId) => ({ ...about, subjectId })),
      );
      return readMyCalendarFeed(tx);
    }),
);
