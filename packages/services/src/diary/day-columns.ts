import type { DayBlock, DayColumn, DayHours, DaySite } from "@withy/contracts/diary";
import type { PlainDateText } from "@withy/core/zoned-time";
import { stateFacts } from "@withy/diary/appointment-states";
import { type Busy, freeIntervals, openIntervals, workingIntervals } from "@withy/diary/availability";
import type { DayClock } from "@withy/diary/day-clock";
import { dayClock, wallMinutes } from "@withy/diary/day-clock";
import { type Interval, intersect, overlaps, totalMinutes } from "@withy/diary/interval";
import { slotMinutes } from "@withy/diary/slots";
import { isWorkedOn } from "@withy/diary/working-pattern";
import { type DayVisit, dayAppointment } from "./day-appointments";
import type { Frame, FrameAbsence, FrameSite } from "./frame";

/** One site's day: its frame, its clock and all visits of its people and rooms, at whatever site. */
export interface SiteDay {
  readonly site: FrameSite;
  readonly clock: DayClock;
  readonly open: readonly Interval[];
  readonly frame: Frame;
  readonly visits: readonly DayVisit[];
  /** Free time is counted from here: now, on the day itself. */
  readonly from: number;
}

const slotMs = slotMinutes * 60_000;

/** The day at each site of the frame, by the site's own clock. */
export function siteDays(
  frame: Frame,
  visits: readonly DayVisit[],
  day: PlainDateText,
  now: Date,
): SiteDay[] {
  return frame.sites.map((site) => {
    const clock = dayClock(day, site.zone);
    const ofDay = visits.filter((v) => v.from < clock.endsAt && v.to > clock.startsAt);
    const from = Math.max(Math.ceil(now.getTime() / slotMs) * slotMs, clock.startsAt);
    return { site, clock, open: openOn(site, clock), frame, visits: ofDay, from };
  });
}

function openOn(site: FrameSite, clock: DayClock): Interval[] {
  return openIntervals({ siteId: site.id, hours: site.hours, closedOn: new Set(site.closed.keys()) }, [
    clock,
  ]);
}

export const wallHours = (set: readonly Interval[], clock: DayClock): DayHours[] =>
  set.map((i) => ({ fromMinute: clock.wallOf(i.from), untilMinute: clock.wallOf(i.to - 60_000) + 1 }));

export function daySite({ site, clock, open }: Pick<SiteDay, "site" | "clock" | "open">): DaySite {
  const hours = wallHours(open, clock);
  const [first, last] = [hours[0], hours.at(-1)];
  const closedReason = site.closed.get(clock.day) ?? (first ? null : "Closed on this weekday");
  return {
    id: site.id,
    name: site.name,
    zone: site.zone,
    hours: first && last ? { fromMinute: first.fromMinute, untilMinute: last.untilMinute } : null,
    closedReason,
  };
}

const busyOf = (v: DayVisit): Busy => ({
  from: v.from,
  to: v.to + v.clean_down_minutes * 60_000,
  siteId: v.site_id,
});
const holds = (v: DayVisit): boolean => stateFacts[v.state].holdsTime;

function absenceBlocks(absences: readonly FrameAbsence[], clock: DayClock): DayBlock[] {
  const day = { from: clock.startsAt, to: clock.endsAt };
  return absences
    .filter((a) => overlaps(a, day))
    .map((a) => {
      const [hours] = wallHours(intersect([{ from: a.from, to: a.to }], [day]), clock);
      return {
        kind: a.kind,
        reason: a.reason,
        fromMinute: hours?.fromMinute ?? 0,
        untilMinute: hours?.untilMinute ?? 0,
      };
    });
}

function breakBlocks(day: SiteDay, therapistId: string): DayBlock[] {
  return day.frame.patterns
    .filter((p) => p.staffMemberId === therapistId && p.siteId === day.site.id)
    .filter((p) => isWorkedOn(p, day.clock.day, day.clock.weekday))
    .flatMap((p) => p.breaks)
    .map((b) => ({
      kind: "break",
      reason: b.label,
      fromMinute: wallMinutes(b.startsAt),
      untilMinute: wallMinutes(b.endsAt),
    }));
}

function column(
  day: SiteDay,
  who: { id: string; name: string },
  hours: readonly Interval[],
  visits: readonly DayVisit[],
  absences: readonly FrameAbsence[],
  breaks: DayBlock[],
): DayColumn {
  const busy = [...visits.filter(holds).map(busyOf), ...absences];
  const free = intersect(freeIntervals(day.site.id, hours, busy, day.frame.travel), [
    { from: day.from, to: day.clock.endsAt },
  ]);
  return {
    id: who.id,
    name: who.name,
    siteId: day.site.id,
    hours: wallHours(hours, day.clock),
    blocks: [...absenceBlocks(absences, day.clock), ...breaks].sort((a, b) => a.fromMinute - b.fromMinute),
    free: wallHours(free, day.clock),
    freeMinutes: totalMinutes(free),
    appointments: visits.filter((v) => v.site_id === day.site.id).map((v) => dayAppointment(v, day.clock)),
  };
}

/** A column for everyone who works at the site that day or has a visit there. */
export function therapistColumns(day: SiteDay): DayColumn[] {
  const names = new Map<string, string>();
  for (const p of day.frame.patterns)
    if (p.siteId === day.site.id && isWorkedOn(p, day.clock.day, day.clock.weekday))
      names.set(p.staffMemberId, p.therapistName);
  for (const v of day.visits)
    if (v.site_id === day.site.id && !names.has(v.therapist_id)) names.set(v.therapist_id, v.therapist_name);
  return [...names].map(([id, name]) => {
    const patterns = day.frame.patterns.filter((p) => p.staffMemberId === id);
    const hours = workingIntervals(day.site.id, patterns, day.open, [day.clock]);
    const visits = day.visits.filter((v) => v.therapist_id === id);
    const absences = day.frame.absences.filter((a) => a.staffMemberId === id);
    return column(day, { id, name }, hours, visits, absences, breakBlocks(day, id));
  });
}

export function roomColumns(day: SiteDay): DayColumn[] {
  return day.frame.rooms
    .filter((r) => r.siteId === day.site.id)
    .map((room) => {
      const visits = day.visits.filter((v) => v.room_id === room.id);
      const absences = day.frame.absences.filter((a) => a.roomId === room.id);
      return column(day, room, day.open, visits, absences, []);
    });
}

/** The hours that a grid must show: those of the sites and of every visit, to whole hours. */
export function gridBounds(
  sites: readonly DaySite[],
  columns: readonly Pick<DayColumn, "hours" | "appointments">[],
): DayHours {
  const spans = [
    ...sites.flatMap((s) => (s.hours ? [s.hours] : [])),
    ...columns.flatMap((c) => [...c.hours, ...c.appointments]),
  ];
  if (spans.length === 0) return { fromMinute: 480, untilMinute: 1080 };
  const fromMinute = Math.floor(Math.min(...spans.map((s) => s.fromMinute)) / 60) * 60;
  const untilMinute = Math.min(1440, Math.ceil(Math.max(...spans.map((s) => s.untilMinute)) / 60) * 60);
  return { fromMinute, untilMinute };
}
