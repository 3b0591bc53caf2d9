import ical, { ICalEventStatus } from "ical-generator";

export interface FeedEvent {
  readonly id: string;
  readonly kind: "appointment" | "class";
  /** Rises with every change, so that a calendar knows the later state. */
  readonly version: number;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly changedAt: Date;
  readonly isCancelled: boolean;
  /** Initials, a name where the practice allows it, or "Class". Never what it is for. */
  readonly summary: string;
  /** Site and room. */
  readonly place: string;
}

/**
 * A therapist's calendar for calendar programs that subscribe to it (RFC 5545). Times are in UTC. Without a METHOD a
 * stamp is the last change of its event, so the same diary gives the same bytes, which its ETag rests on.
 */
export function therapistCalendar(calendar: { name: string; events: readonly FeedEvent[] }): string {
  const feed = ical({
    name: calendar.name,
    prodId: { company: "Withy", product: "Withy", language: "EN" },
    ttl: 900,
  });
  for (const event of calendar.events) {
    feed.createEvent({
      id: `${event.kind}-${event.id}@withy`,
      sequence: event.version,
      stamp: event.changedAt,
      lastModified: event.changedAt,
      start: event.startsAt,
      end: event.endsAt,
      summary: event.summary,
      location: event.place,
      status: event.isCancelled ? ICalEventStatus.CANCELLED : ICalEventStatus.CONFIRMED,
    });
  }
  return feed.toString();
}
