import { longDate } from "@withy/core/date-words";
import { type Refusal, refusal } from "@withy/core/refusal";
import { dayOf, instantAt, type PlainDateText, type PlainTimeText, timeOf } from "@withy/core/zoned-time";
import { type AwayVisit, checkWay } from "./check-way";
import { equipmentWords } from "./equipment";
import { contains, type Interval } from "./interval";
import { missingEquipment, type RoomFacts } from "./room-suits";
import { isOnGrid, isWholeSlots } from "./slots";

export interface BookingFacts {
  readonly startsAt: Date;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
  readonly now: Date;
  /** A visit that was given may still be written down, up to this many minutes after its start. */
  readonly graceMinutes?: number;
  readonly site: { readonly id: string; readonly name: string; readonly zone: string };
  readonly room: RoomFacts & { readonly name: string; readonly siteId: string };
  readonly service: {
    readonly name: string;
    readonly roomKind: string;
    readonly needsEquipment: readonly string[];
    readonly isActive: boolean;
  };
  /** Whether the patient has to reach the room without a step. */
  readonly needsStepFree?: boolean;
  readonly therapist: { readonly name: string; readonly givesService: boolean; readonly isActive: boolean };
  /** When the therapist works at the site around that time, without appointments, leave and blocks taken off. */
  readonly working: readonly Interval[];
  /** Why the site is closed all that day; absent where it is open. */
  readonly closedReason?: string | undefined;
  /** Leave and blocks of the therapist and of the room. */
  readonly blocked: readonly (Interval & { readonly reason: string })[];
  /** The therapist's visits at other sites around that time. */
  readonly away?: readonly AwayVisit[];
  /** Why it is booked outside working hours all the same; empty or absent where it is not. */
  readonly overrideReason?: string | undefined;
}

/**
 * The instant meant by a day and a clock time at the site.
 * A time in the hour that the clocks jump over is refused; one that is shown twice means the first.
 */
export function readStart(day: PlainDateText, time: PlainTimeText, zone: string): Date | Refusal {
  const at = instantAt(day, time, zone);
  if (at) return at;
  const message = `The clocks go forward on ${longDate(day)} and ${time} does not happen. Choose a time after it.`;
  return refusal("clock-gap", message, "startsAt");
}

function checkLength(f: BookingFacts): Refusal | null {
  if (!isOnGrid(f.startsAt))
    return refusal("off-grid", "Choose a start on five minutes, such as 10:05 or 10:10.", "startsAt");
  const cleanDownFits = f.cleanDownMinutes === 0 || isWholeSlots(f.cleanDownMinutes);
  if (!isWholeSlots(f.durationMinutes) || !cleanDownFits)
    return refusal("odd-length", "Choose a length that is a multiple of five minutes.", "durationMinutes");
  if (f.durationMinutes > 480)
    return refusal("too-long", "Choose a length of eight hours or less.", "durationMinutes");
  return null;
}

function checkPlace(f: BookingFacts): Refusal | null {
  if (f.room.siteId !== f.site.id)
    return refusal(
      "room-elsewhere",
      `${f.room.name} is not at ${f.site.name}. Choose a room there.`,
      "roomId",
    );
  if (!f.service.isActive)
    return refusal("service-ended", `${f.service.name} is no longer offered. Choose another.`, "serviceId");
  if (f.room.kind !== f.service.roomKind)
    return refusal(
      "wrong-room",
      `${f.service.name} needs another kind of room than ${f.room.name}.`,
      "roomId",
    );
  const missing = missingEquipment(f.room, f.service.needsEquipment);
  if (missing.length > 0)
    return refusal(
      "wrong-room",
      `${f.service.name} needs ${equipmentWords(missing)}, and ${f.room.name} has none. Choose another room.`,
      "roomId",
    );
  if (f.needsStepFree === true && !f.room.isStepFree)
    return refusal(
      "wrong-room",
      `${f.room.name} is not reached without a step. Choose another room.`,
      "roomId",
    );
  if (!f.therapist.isActive || !f.therapist.givesService)
    return refusal(
      "wrong-therapist",
      `${f.therapist.name} does not give ${f.service.name}. Choose another therapist.`,
      "therapistId",
    );
  return null;
}

function checkHours(f: BookingFacts): Refusal | null {
  const from = f.startsAt.getTime();
  const visit = { from, to: from + f.durationMinutes * 60_000 };
  if ((f.overrideReason ?? "").trim() !== "") return null;
  const block = f.blocked.find((b) => b.from < visit.to && visit.from < b.to);
  if (block) {
    const until = timeOf(new Date(block.to), f.site.zone);
    const message = `That time is kept free until ${until}: ${block.reason}. Choose another time, or say why it is booked all the same.`;
    return refusal("blocked", message, "startsAt");
  }
  if (f.working.some((w) => contains(w, visit))) return null;
  const day = longDate(dayOf(f.startsAt, f.site.zone));
  if (f.closedReason !== undefined) {
    const closed = `${f.site.name} is closed on ${day}: ${f.closedReason}. Choose another day, or say why it is booked all the same.`;
    return refusal("outside-hours", closed, "startsAt");
  }
  const message = `${f.therapist.name} does not work at ${f.site.name} at that time on ${day}. Choose another time, or say why it is booked all the same.`;
  return refusal("outside-hours", message, "startsAt");
}

/**
 * Whether a visit may be booked at that time, apart from what is already taken (the database alone decides that).
 * Working hours, blocks and the way between sites give way to a reason; nothing else does.
 * @returns the first thing in the way, or null
 */
export function checkBooking(f: BookingFacts): Refusal | null {
  const length = checkLength(f);
  if (length) return length;
  if (f.startsAt.getTime() + (f.graceMinutes ?? 0) * 60_000 < f.now.getTime())
    return refusal("in-the-past", "That time has passed. Choose a later one.", "startsAt");
  return checkPlace(f) ?? checkHours(f) ?? checkWay(f);
}
