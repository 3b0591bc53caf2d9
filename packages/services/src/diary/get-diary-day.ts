import { type DiaryDayView, getDiaryDayInput } from "@withy/contracts/diary";
import { dayOf } from "@withy/core/zoned-time";
import { stateFacts } from "@withy/diary/appointment-states";
import { verb } from "../verb";
import { daySite, gridBounds, roomColumns, therapistColumns } from "./day-columns";
import { readSiteDays } from "./read-site-days";
import { readableSites } from "./site-reach";

/** A gap on the day's list is one that a visit would fit into. */
const shortestGapMinutes = 20;

/** One day of one or more sites as columns: hours, blocks, visits and what is still free. */
export const getDiaryDay = verb("diary.read", getDiaryDayInput, async (ctx, input): Promise<DiaryDayView> => {
  const siteIds = await readableSites(ctx, input.siteIds);
  const now = ctx.clock.now();
  const today = dayOf(now, ctx.zone);
  const day = input.day ?? today;
  const { frame, days } = await readSiteDays(ctx, siteIds, day);
  const columns = days.flatMap((d) => (input.by === "room" ? roomColumns(d) : therapistColumns(d)));
  const sites = days.map(daySite);
  const all = columns.flatMap((c) => c.appointments);
  const first = days[0];
  const isNow =
    first !== undefined && first.clock.startsAt <= now.getTime() && now.getTime() < first.clock.endsAt;
  return {
    day,
    by: input.by,
    sites,
    bounds: gridBounds(sites, columns),
    nowMinute: isNow ? Math.floor(first.clock.wallOf(now.getTime())) : null,
    columns,
    counts: {
      booked: all.filter((a) => stateFacts[a.state].holdsTime).length,
      waiting: all.filter((a) => a.state === "arrived").length,
      gaps: columns.flatMap((c) => c.free).filter((f) => f.untilMinute - f.fromMinute >= shortestGapMinutes)
        .length,
    },
    pulse: frame.pulse,
  };
});
