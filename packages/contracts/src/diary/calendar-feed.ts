import { z } from "zod";

export const getMyCalendarFeedInput = z.strictObject({});
export const makeCalendarFeedInput = z.strictObject({});
export const revokeCalendarFeedInput = z.strictObject({});

/** The secret part of a feed's address: 256 random bits. */
export const feedTokenPattern = /^[A-Za-z0-9_-]{43}$/;

/** One's own calendar feed as the account page shows it; never its address, which is kept nowhere. */
export interface CalendarFeedView {
  readonly createdAt: string;
  /** The last day on which a calendar fetched it; null for never. */
  readonly lastReadOn: string | null;
}

/** The state of one's feed: whether one can have it, and the live one if there is one. */
export interface MyCalendarFeedView {
  readonly canHaveFeed: boolean;
  readonly feed: CalendarFeedView | null;
}

/** The address of a new feed; given once, since only its hash is kept. */
export interface NewCalendarFeedView {
  readonly path: string;
  readonly feed: CalendarFeedView;
}
