import type { LetterActor, LetterSource, LetterView } from "@withy/contracts/letters";
import { messageStateWords } from "@withy/contracts/message-words";
import { longDate, proseTime, shortDate } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/wall-clock";

export const actorWords: Record<LetterActor, string> = { gp: "GP", patient: "Patient", practice: "Us" };

/** Where a sentence's source is opened. */
export function sourceAddress(source: LetterSource, letter: Pick<LetterView, "patient" | "episode">): string {
  const record = `/patients/${letter.patient.id}`;
  switch (source.kind) {
    case "note":
      return `/notes/${source.id}`;
    case "measure":
      return `${record}/measures`;
    case "programme":
      return `/exercises/programmes/${source.id}`;
    case "patient":
      return record;
    default:
      return `${record}/episodes/${letter.episode.id}`;
  }
}

/** "Tuesday 1 December 2026 at 10:42am", on the site's clock. */
export function momentWords(iso: string, zone: string): string {
  const at = new Date(iso);
  return `${longDate(dayOf(at, zone))} at ${proseTime(timeOf(at, zone))}`;
}

/** "1 Dec, 10:42". */
export function shortMoment(iso: string, zone: string): string {
  const at = new Date(iso);
  return `${shortDate(dayOf(at, zone), dayOf(new Date(), zone))}, ${timeOf(at, zone)}`;
}

/** "1 Dec". */
export function shortDay(iso: string, zone: string): string {
  return shortDate(dayOf(new Date(iso), zone), dayOf(new Date(), zone));
}

export const clockNow = (zone: string): string => timeOf(new Date(), zone);

/** What became of one sending, in a line. */
export function deliveryWords(delivery: LetterView["deliveries"][number], zone: string): string {
  if (delivery.channel === "print") return `printed and posted, ${shortMoment(delivery.requestedAt, zone)}`;
  if (delivery.firstOpenedAt) return `opened ${shortMoment(delivery.firstOpenedAt, zone)}`;
  if (delivery.state === "sent" && delivery.sentAt)
    return `sent ${shortMoment(delivery.sentAt, zone)}, not opened yet`;
  return messageStateWords[delivery.state ?? "waiting"].toLowerCase();
}
