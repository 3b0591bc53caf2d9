import { AppError } from "@withy/core/errors";
import { addDays, dayBounds, dayOf, daysBetween } from "@withy/core/zoned-time";
import { type Interval, intersect, subtract, union } from "@withy/diary/interval";
import { slotResource } from "@withy/documents/fhir/resources";
import {
  readSlotId,
  type SlotKey,
  type SlotStatus,
  scheduleId,
  slotId,
} from "@withy/documents/fhir/schedule-id";
import type { Context } from "../../context";
import { freeTime, readClaimed, readTherapistDays } from "../therapist-day";
import type { KeyContext } from "./open-by-key";
import { type FhirQuery, strangePage } from "./read-query";
import { findSchedule, type PracticeSchedule, readSchedules, schedulesAsked } from "./search-schedules";

const usualDays = 7;
const mostDays = 31;

/** The diary's own reading of free time asks for a whole context; a key stands for no person and holds no role. */
const asContext = (ctx: KeyContext): Context => ({
  ...ctx,
  staffMemberId: "",
  staffName: "",
  sessionId: "",
  roles: [],
  deskSiteId: "",
  idempotencyKey: null,
});

/** What the days of one schedule hold: free, taken, and away from work inside working hours. */
async function slotsOfDays(
  ctx: KeyContext,
  schedule: PracticeSchedule,
  firstDay: string,
  days: number,
): Promise<SlotKey[]> {
  const { therapistId, siteId, zone } = schedule;
  const own = asContext(ctx);
  const read = await readTherapistDays(own, therapistId, { id: siteId, zone }, firstDay, days);
  if (!read) return [];
  const from = dayBounds(firstDay, zone).from;
  const to = dayBounds(addDays(firstDay, days), zone).from;
  const claims = (await readClaimed(own, [therapistId], from, to)).get(therapistId) ?? [];
  const working = union(read.working);
  const free = freeTime(read, claims, 0);
  const taken = intersect(union(claims), working);
  const away = subtract(subtract(working, taken), union(free));
  const keyed = (status: SlotStatus, intervals: readonly Interval[]): SlotKey[] =>
    intervals.map((i) => ({ therapistId, siteId, from: i.from, to: i.to, status }));
  return [...keyed("free", union(free)), ...keyed("busy", taken), ...keyed("busy-unavailable", away)];
}

interface Days {
  readonly firstDay: string;
  readonly days: number;
  readonly from: number;
  readonly to: number;
}

/** From today on: what was free in the past is no use, and what was taken is told by Appointment. */
function daysOf(ctx: KeyContext, q: FhirQuery): Days {
  const today = dayBounds(dayOf(ctx.clock.now(), ctx.zone), ctx.zone).from.getTime();
  const from = Math.max(q.from ?? today, today);
  const to = q.to ?? dayBounds(addDays(dayOf(new Date(from), ctx.zone), usualDays), ctx.zone).from.getTime();
  const firstDay = addDays(dayOf(new Date(from), ctx.zone), -1);
  const lastDay = addDays(dayOf(new Date(Math.max(from, to - 1)), ctx.zone), 1);
  const days = daysBetween(firstDay, lastDay) + 1;
  if (days > mostDays + 2)
    throw new AppError("invalid", `Ask for ${mostDays} days of slots at most, with ge and lt.`, {
      kind: "too-costly",
    });
  return { firstDay, days, from, to };
}

const keyOf = (slot: SlotKey): string => `${String(slot.from).padStart(15, "0")}.${slotId(slot)}`;

/** One page of slots in the order of their start, of the schedules that are named one way or another. */
export async function searchSlots(ctx: KeyContext, q: FhirQuery) {
  if (q.practitioners === null && q.locations === null && q.schedules === null)
    throw new AppError("invalid", "Name a practitioner, a location or a schedule whose slots you want.", {
      kind: "too-costly",
    });
  if (q.after !== null && !/^\d{15}\.[A-Za-z0-9.-]{54}$/.test(q.after)) throw strangePage();
  const { firstDay, days, from, to } = daysOf(ctx, q);
  const slots: SlotKey[] = [];
  for (const schedule of schedulesAsked(await readSchedules(ctx), q))
    slots.push(...(await slotsOfDays(ctx, schedule, firstDay, days)));
  const found = slots
    .filter((slot) => slot.from >= from && slot.from < to)
    .filter((slot) => q.statuses === null || q.statuses.includes(slot.status))
    .map((slot) => ({ slot, key: keyOf(slot) }))
    .filter(({ key }) => q.after === null || key > q.after)
    .sort((a, b) => (a.key < b.key ? -1 : 1));
  const page = found.slice(0, q.count);
  return {
    resources: page.map(({ slot }) => slotResource(slot)),
    after: found.length > page.length ? (page.at(-1)?.key ?? null) : null,
  };
}

/** The slot of an id as long as the diary still holds just that stretch. */
export async function readSlotResource(ctx: KeyContext, id: string) {
  const key = readSlotId(id);
  const schedule = key && (await findSchedule(ctx, scheduleId(key)));
  if (!key || !schedule) return null;
  const day = dayOf(new Date(key.from), schedule.zone);
  if (day < dayOf(ctx.clock.now(), schedule.zone)) return null;
  const slot = (await slotsOfDays(ctx, schedule, day, 1)).find((one) => slotId(one) === id);
  return slot ? slotResource(slot) : null;
}
