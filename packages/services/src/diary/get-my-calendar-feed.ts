import { getMyCalendarFeedInput } from "@withy/contracts/diary";
import { verb } from "../verb";
import { readMyCalendarFeed } from "./my-calendar-feed";

/** The state of one's own calendar feed. */
export const getMyCalendarFeed = verb("account.own", getMyCalendarFeedInput, (ctx) =>
  readMyCalendarFeed(ctx),
);
