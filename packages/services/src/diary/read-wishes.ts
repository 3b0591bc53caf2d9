import type { findTimesInput } from "@withy/contracts/diary";
import { instantAt } from "@withy/core/zoned-time";
import type { Interval } from "@withy/diary/interval";
import type { TimeWishes } from "@withy/diary/time-wishes";
import type { z } from "zod";
import type { Context } from "../context";

type Query = z.output<typeof findTimesInput>;

/** An edge that the clocks jump over means the hour after it. */
function edge(day: string, time: string, zone: string): number {
  const at = instantAt(day, time, zone) ?? new Date(`${day}T${time}:00Z`);
  return at.getTime();
}

function windowsOf(windows: readonly string[], zone: string): Interval[] {
  return windows.map((text) => {
    const [day = "", times = ""] = text.split("T");
    const [from = "", until = ""] = times.split("/");
    return { from: edge(day, from, zone), to: edge(day, until, zone) };
  });
}

/** What the caller asks for, as the pure search takes it. Windows are read by the practice's clock. */
export function wishesOf(ctx: Pick<Context, "zone">, input: Query): TimeWishes {
  const { weekdays, partsOfDay, fromTime, untilTime, siteIds, therapistIds, latestOn } = input;
  return {
    ...{ weekdays, partsOfDay, fromTime, untilTime, siteIds, therapistIds, latestOn },
    windows: windowsOf(input.windows, ctx.zone),
    needsRoom: input.needsStepFree || input.equipment.length > 0,
  };
}
