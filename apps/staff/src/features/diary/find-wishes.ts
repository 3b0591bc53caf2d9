import { shortDate } from "@withy/core/date-words";
import { isPlainDate } from "@withy/core/plain-date";
import type { RankConcern, Urgency, Weights } from "@withy/diary/rank-time";
import type { WishKind } from "@withy/diary/time-wishes";
import { readTime } from "./minute-words";

/** What the caller asks for, as it is being typed. */
export interface Wishes {
  serviceId: string;
  /** "1" Monday to "7" Sunday; none means any. */
  weekdays: readonly string[];
  fromText: string;
  untilText: string;
  earliestText: string;
  earliestOn: string | null;
  therapistId: string;
  siteIds: readonly string[];
  latestText: string;
  latestOn: string | null;
  /** Exact windows, as the server reads them: "2026-12-08T10:00/12:00". */
  windows: readonly string[];
  /** "step-free" and codes of equipment. */
  needs: readonly string[];
  urgency: Urgency;
  /** Empty: as the practice weighs it. */
  order: readonly RankConcern[];
}

export const concerns: readonly RankConcern[] = ["wish", "wait", "knows", "day"];

/** The order that the practice's weights come to. */
export const orderOf = (weights: Weights): RankConcern[] =>
  [...concerns].sort((a, b) => weights[b] - weights[a]);

/** The wishes that an address carries: a gap on Today or "book next" on a visit fills them in. */
export function readWishes(query: URLSearchParams): Wishes {
  const on = query.get("on");
  const day = on && isPlainDate(on) ? on : null;
  return {
    serviceId: query.get("service") ?? "",
    weekdays: query.getAll("weekday").filter((n) => /^[1-7]$/.test(n)),
    fromText: query.get("from") ?? "",
    untilText: query.get("until") ?? "",
    earliestText: day ? shortDate(day) : "",
    earliestOn: day,
    therapistId: query.get("therapist") ?? "",
    siteIds: query.getAll("site"),
    ...{ latestText: "", latestOn: null, windows: [], needs: [], urgency: "routine", order: [] },
  };
}

/** The question to the server, or null while there is nothing to look for yet. */
export function timesQuery(wishes: Wishes, patientId: string | null) {
  if (wishes.serviceId === "") return null;
  return {
    serviceId: wishes.serviceId,
    patientId,
    weekdays: wishes.weekdays,
    fromTime: readTime(wishes.fromText),
    untilTime: readTime(wishes.untilText),
    earliestOn: wishes.earliestOn,
    therapistIds: wishes.therapistId ? [wishes.therapistId] : [],
    siteIds: wishes.siteIds,
    latestOn: wishes.latestOn,
    windows: wishes.windows,
    needsStepFree: wishes.needs.includes("step-free"),
    equipment: wishes.needs.filter((code) => code !== "step-free"),
    urgency: wishes.urgency,
    order: wishes.order,
  };
}

/** The wishes without the one that stands in the way. */
export function relaxed(wish: WishKind): Partial<Wishes> {
  switch (wish) {
    case "days":
      return { weekdays: [] };
    case "hours":
      return { fromText: "", untilText: "" };
    case "site":
      return { siteIds: [] };
    case "therapist":
      return { therapistId: "" };
    case "latest":
      return { latestText: "", latestOn: null };
    case "windows":
      return { windows: [] };
    case "needs":
      return { needs: [] };
  }
}

/** The order with one concern moved a place forward. */
export function promoted(order: readonly RankConcern[], concern: RankConcern): RankConcern[] {
  const at = order.indexOf(concern);
  if (at < 1) return [...order];
  const next = order.filter((one) => one !== concern);
  next.splice(at - 1, 0, concern);
  return next;
}
