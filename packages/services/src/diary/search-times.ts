import type { FoundTimesView, findTimesInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addDays, dayBounds, dayOf, minutesBetween } from "@withy/core/zoned-time";
import type { services } from "@withy/db/schema";
import { findTimes as rankTimes } from "@withy/diary/find-times";
import type { FindTimesInput, FoundTimes } from "@withy/diary/found-times";
import { bestScoreAfter, searchWeights, type Weights, wishScore } from "@withy/diary/rank-time";
import { wishBit } from "@withy/diary/time-wishes";
import type { z } from "zod";
import type { Context } from "../context";
import { FreeLanes } from "./free-lanes";
import { wishesOf } from "./read-wishes";

export type FindTimesQuery = z.output<typeof findTimesInput>;
export type SeenBy = FoundTimesView["seenBy"];

const daysAhead = 56;
/** How far a search looks before it asks whether anything later could come among the best. */
const nearDays = [4, 14];
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

export interface Search {
  readonly service: typeof services.$inferSelect;
  readonly siteIds: readonly string[];
  readonly therapistIds: readonly string[];
  readonly shortestSellableMinutes: number;
  readonly seenBy: SeenBy;
  /** The practice's own, for whoever gives no order. */
  readonly weights: Weights;
}

export interface Searched {
  readonly search: FindTimesInput;
  readonly found: FoundTimes;
}

async function searchUpTo(
  ctx: Context,
  input: FindTimesQuery,
  s: Search,
  lanes: FreeLanes,
  window: Window,
): Promise<Searched> {
  const { durationMinutes, cleanDownMinutes } = s.service;
  const { shortestSellableMinutes, weights } = s;
  const { order, urgency, limit } = input;
  const search: FindTimesInput = {
    ...{ now: ctx.clock.now(), ...window, durationMinutes, cleanDownMinutes, shortestSellableMinutes },
    ...(await lanes.upTo(window.to)),
    wishes: wishesOf(ctx, input),
    seenBy: s.seenBy.map(({ therapistId, visits }, n) => ({ therapistId, visits, isLast: n === 0 })),
    ...{ order, weights, urgency, limit },
  };
  return { search, found: rankTimes(search) };
}

/** Where a search may stop early, and the best wish score of whatever lies beyond. */
function stops(ctx: Context, input: FindTimesQuery, window: Window): { at: Date; wishBeyond: number }[] {
  const first = dayOf(window.from, ctx.zone);
  const { latestOn } = input;
  const late = wishScore(wishBit.latest, wishBit.hours, 0);
  return nearDays
    .map((days) => {
      const isByDate = latestOn !== undefined && latestOn < addDays(first, days);
      const end = isByDate ? addDays(latestOn, 1) : addDays(first, days);
      return { at: dayBounds(end, ctx.zone).from, wishBeyond: isByDate ? late : 1 };
    })
    .filter(({ at }) => window.from < at && at < window.to);
}

function lanesQuery(input: FindTimesQuery, s: Search, window: Window) {
  const { roomKind, needsEquipment, cleanDownMinutes } = s.service;
  return {
    ...window,
    ...{ siteIds: s.siteIds, therapistIds: s.therapistIds, cleanDownMinutes },
    room: { kind: roomKind, equipment: needsEquipment, isStepFree: false },
    patientNeeds: { equipment: input.equipment, isStepFree: input.needsStepFree },
    movingId: input.movingId ?? null,
  };
}

/**
 * Searches the near days and stops there when nothing later could come among the best; else further, and at last the
 * whole window. The answer is the same, since the best possible score of a later time is known.
 */
export async function searchAll(ctx: Context, input: FindTimesQuery, s: Search, window: Window) {
  const near = stops(ctx, input, window);
  const lanes = await FreeLanes.read(ctx, lanesQuery(input, s, window), near[0]?.at ?? window.to);
  const weights = searchWeights({ order: input.order, weights: s.weights, urgency: input.urgency });
  for (const { at, wishBeyond } of near) {
    const so = await searchUpTo(ctx, input, s, lanes, { from: window.from, to: at });
    const worst = so.found.times[input.limit - 1];
    const later = bestScoreAfter(minutesBetween(window.from, at), weights, wishBeyond);
    if (so.found.meetingEveryWish > 0 && worst !== undefined && worst.score >= later) return so;
  }
  return searchUpTo(ctx, input, s, lanes, window);
}
