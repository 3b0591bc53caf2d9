import {
  type DayBlock,
  getTherapistWeekInput,
  type TherapistWeekView,
  type WeekDay,
} from "@withy/contracts/diary";
import { notFound } from "@withy/core/errors";
import { addDays, dayOf, weekdayOf } from "@withy/core/zoned-time";
import { staffMembers } from "@withy/db/schema";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { verb } from "../verb";
import { type DayVisit, readDayVisits } from "./day-appointments";
import { daySite, gridBounds, siteDays, therapistColumns } from "./day-columns";
import { type Frame, readFrame } from "./frame";
import { reachableSites } from "./site-reach";

interface Week {
  readonly ctx: Context;
  readonly therapistId: string;
  readonly frame: Frame;
  readonly visits: readonly DayVisit[];
}

const sameBlock = (a: DayBlock, b: DayBlock): boolean =>
  a.fromMinute === b.fromMinute && a.untilMinute === b.untilMinute && a.reason === b.reason;

function weekDay({ ctx, therapistId, frame, visits }: Week, day: string): WeekDay {
  const lanes = siteDays(frame, visits, day, ctx.clock.now()).map((siteDay) => ({
    site: siteDay.site,
    closedReason: daySite(siteDay).closedReason,
    column: therapistColumns(siteDay).find((c) => c.id === therapistId),
  }));
  const worked = lanes.filter((l) => l.column !== undefined);
  const blocks = worked.flatMap((l) => l.column?.blocks ?? []);
  return {
    day,
    sites: worked.map((l) => ({ id: l.site.id, name: l.site.name, hours: l.column?.hours ?? [] })),
    blocks: blocks.filter((b, n) => blocks.findIndex((o) => sameBlock(o, b)) === n),
    closedReason:
      worked.length > 0 && worked.every((l) => l.column?.hours.length === 0)
        ? (worked[0]?.closedReason ?? null)
        : null,
    freeMinutes: worked.reduce((sum, l) => sum + (l.column?.freeMinutes ?? 0), 0),
    appointments: worked
      .flatMap((l) => l.column?.appointments ?? [])
      .sort((a, b) => a.startsAt.localeCompare(b.startsAt)),
  };
}

/** A therapist's week from Monday, over every site within the reader's reach. */
export const getTherapistWeek = verb(
  "diary.read",
  getTherapistWeekInput,
  async (ctx, input): Promise<TherapistWeekView> => {
    const therapist = await loadRecord(ctx, staffMembers, input.therapistId, "therapist");
    if (!therapist.isTherapist) throw notFound("therapist");
    const siteIds = await reachableSites(ctx, "diary.read");
    const any = input.day ?? dayOf(ctx.clock.now(), ctx.zone);
    const monday = addDays(any, 1 - weekdayOf(any));
    const days = Array.from({ length: 7 }, (_, n) => addDays(monday, n));
    const therapistIds = [therapist.id];
    const [frame, visits] = await Promise.all([
      readFrame(ctx, { firstDay: monday, lastDay: addDays(monday, 6), siteIds, therapistIds }),
      readDayVisits(
        ctx,
        { therapistId: therapist.id },
        new Date(`${addDays(monday, -1)}T00:00:00Z`),
        new Date(`${addDays(monday, 8)}T00:00:00Z`),
      ),
    ]);
    const week: Week = {
      ctx,
      therapistId: therapist.id,
      frame,
      visits: visits.filter((v) => siteIds.includes(v.site_id)),
    };
    const views = days.map((day) => weekDay(week, day));
    const columns = views.map((v) => ({
      hours: v.sites.flatMap((s) => s.hours),
      appointments: v.appointments,
    }));
    return {
      therapist: { id: therapist.id, name: `${therapist.givenName} ${therapist.familyName}` },
      zone: frame.sites[0]?.zone ?? ctx.zone,
      days: views,
      bounds: gridBounds([], columns),
    };
  },
);
