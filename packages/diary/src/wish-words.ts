import { weekdayDate } from "@withy/core/date-words";
import type { WaitingWishes } from "./waiting-match";
import { weekdayNames } from "./waiting-words";

const listed = (words: readonly string[]): string =>
  words.length < 2 ? (words[0] ?? "") : `${words.slice(0, -1).join(", ")} or ${words.at(-1)}`;

/**
 * What someone would take, in a line: "Mon or Tue, mornings, at Saltgate, by Sat 12 Dec". Empty where anything will do.
 * @param nameOf the name of a site or therapist
 */
export function wishWords(wishes: WaitingWishes, nameOf: (id: string) => string): string {
  const { weekdays = [], partsOfDay = [], siteIds = [], therapistIds = [], latestOn, noticeHours } = wishes;
  const days = [...weekdays].sort().map((n) => weekdayNames[n - 1]?.slice(0, 3) ?? "");
  return [
    listed(days),
    listed(partsOfDay.map((part) => `${part}s`)),
    siteIds.length > 0 ? `at ${listed(siteIds.map(nameOf))}` : "",
    therapistIds.length > 0 ? `with ${listed(therapistIds.map(nameOf))}` : "",
    latestOn === undefined ? "" : `by ${weekdayDate(latestOn)}`,
    noticeHours ? `with ${noticeHours} h notice` : "",
  ]
    .filter((word) => word !== "")
    .join(", ");
}
