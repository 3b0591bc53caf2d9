import { longDate, proseTime } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import type { FindTimesInput, NoTimes, Tally } from "./found-times";
import { type WishKind, wishBit, wishKinds } from "./time-wishes";

const givingUp: Record<WishKind, string> = {
  days: "Any day of the week",
  hours: "Any hour of the day",
  site: "Any site",
  therapist: "Any therapist",
  latest: "A later date",
  windows: "Any time outside the windows",
  needs: "A room without what was asked of it",
};

function bestRelaxation(input: FindTimesInput, tally: Tally): NoTimes["relax"] {
  let best: NoTimes["relax"] = null;
  for (const wish of wishKinds) {
    const found = tally.byBroken.get(wishBit[wish]);
    if (!found || found.times <= (best?.times ?? 0)) continue;
    const zone = input.sites.find((s) => s.id === found.siteId)?.zone ?? "Europe/London";
    const first = new Date(found.first);
    const when = `${longDate(dayOf(first, zone))} at ${proseTime(timeOf(first, zone))}`;
    const count = found.times === 1 ? "1 time" : `${found.times} times`;
    best = {
      wish,
      times: found.times,
      message: `${givingUp[wish]} would give ${count}, the first on ${when}.`,
    };
  }
  return best;
}

export function explainNone(input: FindTimesInput, tally: Tally, needMs: number): NoTimes {
  const none = (kind: NoTimes["kind"], message: string): NoTimes => ({ kind, message, relax: null });
  if (input.free.length === 0)
    return none("no-therapist", "No therapist gives this service here. Choose another service or site.");
  if (tally.longestFree < needMs)
    return none(
      "no-free-time",
      "Everyone who gives this service is full or away. Look at later dates, or use the waiting list.",
    );
  if (tally.lookedAt === 0)
    return none(
      "no-room",
      "Therapists are free, but no room of the right kind is. Look at later dates or another site.",
    );
  const relax = bestRelaxation(input, tally);
  const message = relax
    ? "No time meets every wish."
    : "No time meets these wishes, nor all but one of them. Ask for less.";
  return { kind: "wishes", message, relax };
}
