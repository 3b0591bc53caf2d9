import type { FoundTimesView, findTimesInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addDays, dayBounds, dayOf, minutesBetween } from "@withy/core/zoned-time";
import type { services } from "@withy/db/schema";
import { findTimes as rankTimes } from "@withy/diary/find-times";
import type { FindTimesInput } from "@withy/diary/found-times";
import { bestScoreAfter, wishScore } from "@withy/diary/rank-time";
import { wishBit } from "@withy/diary/time-wishes";
import type { z } from "zod";
import type { Context } from "../context";
import { readFreeLanes } from "./free-lanes";

export type FindTimesQuery = z.output<typeof findTimesInput>;
export type SeenBy = FoundTimesView["seenBy"];

const daysAhead = 56;
const nearDays = 14;
/** Looked at beyond the latest date asked for, so that a later date can be proposed. */
const daysBeyond = 14;

export interface Window {
  readonly from: Date;
  readonly to: Date;
}

/** @throws refused `in-the-past` or `dates-reversed` where the dates leave nothing to search */
export function windowOf(ctx: Context, input: FindTimesQuery): Window {
  const now = ctx.clock.now();
  const today = dayOf(now, ctx.zone);
  const first = input.earliestOn !== undefined && input.earliestOn > today ? input.earliestOn : today;
  if (input.latestOn !== undefined && input.latestOn < today)
    throw refused(refusal("in-the-past", "The latest date has passed. Choose a later one.", "latestOn"));
  if (input.latestOn !== undefined && input.latestOn < first)
    throw refused(
      refusal("dates-reversed", "The latest date is before the earliest. Change one of them.", "latestOn"),
    );
  const last = input.latestOn ?? addDays(first, daysAhead);
  if (last > addDays(first, 370))
    throw refused(refusal("too-far", "Choose a latest date within a year of the earliest.", "latestOn"));
  const from = first === today ? now : dayBounds(first, ctx.zone).from;
  const beyond = input.latestOn === undefined ? 0 : daysBeyond;
  return { from, to: dayBounds(addDays(last, beyond), ctx.zone).to };
}

function wishesOf(input: FindTimesQuery): FindTimesInput["wishes"] {
  const { weekdays, partsOfDay, fromTime, untilTime, siteIds, therapistIds, latestOn } = input;
  return { weekdays, partsOfDay, fromTime, untilTime, siteIds, therapistIds, latestOn };
}

export interface Search {
  readonly service: typeof services.$inferSelect;
  readonly siteIds: readonly string[];
  readonly therapistIds: readonly string[];
  readonly shortestSellableMinutes: number;
  readonly seenBy: SeenBy;
}

async function searchWindow(ctx: Context, input: FindTimesQuery, s: Search, window: Window) {
  const { durationMinutes, cleanDownMinutes, roomKind } = s.service;
  const { siteIds, therapistIds, shortestSellableMinutes } = s;
  const movingId = input.movingId ?? null;
  const lanes = await readFreeLanes(ctx, {
    ...window,
    siteIds,
    therapistIds,
    roomKind,
    cleanDownMinutes,
    movingId,
  });
  const search: FindTimesInput = {
    ...{
      now: ctx.clock.now(),
      ...window,
      durationMinutes,
      cleanDownMinutes,
      shortestSellableMinutes,
      ...lanes,
    },
    wishes: wishesOf(input),
    seenBy: s.seenBy.map(({ therapistId, visits }, n) => ({ therapistId, visits, isLast: n === 0 })),
    order: input.order,
    limit: input.limit,
  };
  return { search, found: rankTimes(search) };
}

/** Where a search may stop early, and the best wish score of whatever lies beyond. */
function nearEnd(ctx: Context, input: FindTimesQuery, window: Window): { at: Date; wishBeyond: number } {
  const fortnight = addDays(dayOf(window.from, ctx.zone), nearDays);
  const { latestOn } = input;
  const isByDate = latestOn !== undefined && latestOn < fortnight;
  const at = dayBounds(isByDate ? addDays(latestOn, 1) : fortnight, ctx.zone).from;
  return { at, wishBeyond: isByDate ? wishScore(wishBit.latest, wishBit.hours, 0) : 1 };
}

/**
 * Searches the near days and stops there when nothing later could come among the best; else the whole window. The
 * answer is the same, since the best possible score of a later time is known.
 */
export async function searchAll(ctx: Context, input: FindTimesQuery, s: Search, window: Window) {
  const { at, wishBeyond } = nearEnd(ctx, input, window);
  if (window.from < at && at < window.to) {
    const near = await searchWindow(ctx, input, s, { from: window.from, to: at });
    const worst = near.found.times[input.limit - 1];
    const later = bestScoreAfter(minutesBetween(window.from, at), input.order, wishBeyond);
    if (near.found.meetingEveryWish > 0 && worst !== undefined && worst.score >= later) return near;
  }
  return searchWindow(ctx, input, s, window);
}
