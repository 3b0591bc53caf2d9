import type { CoverVisit } from "./cover-problem";

/**
 * What a change costs a patient, in whole points. The scale is ours; what counts is the order that it makes:
 *
 * | change | points | why |
 * |---|---|---|
 * | another therapist who has treated the patient | 15 | the story is known, the hands are not new |
 * | another therapist who has not | 40 | the patient starts again: worth about three hours of shifting |
 * | a course leaves its therapist | 25 more | the plan was made for the whole course |
 * | five minutes earlier or later, same day | 1 | an hour costs 12: less than a new therapist, more than a known one |
 * | another day | 60, and 15 for each day after the first | dearer than a new therapist, for pain does not wait |
 * | a quarter of an hour by the clock, on another day | 1 | the time of day was chosen to suit the patient's week |
 * | another site | 45 | a journey to somewhere new; like a new therapist |
 * | another room | 1 | nobody minds, but nothing is moved for nothing |
 *
 * A class moves as one: everyone on its list bears the change, so all but the room counts once for each.
 */
export const coverPoints = {
  knownTherapist: 15,
  newTherapist: 40,
  courseLeaves: 25,
  fiveMinutes: 1,
  otherDay: 60,
  furtherDay: 15,
  quarterOnOtherDay: 1,
  otherSite: 45,
  otherRoom: 1,
} as const;

export interface CoverChange {
  readonly therapistId: string;
  readonly siteId: string;
  readonly roomId: string;
  /** Days after the visit's own day; 0 for the same. */
  readonly days: number;
  /** Minutes by the clock against the visit's own time, later positive. */
  readonly minutes: number;
}

interface Part {
  readonly points: number;
  readonly words: string;
}

function therapistPart(visit: CoverVisit, change: CoverChange): Part[] {
  if (change.therapistId === visit.therapistId) return [];
  const isKnown = visit.seenBy.includes(change.therapistId);
  const who = isKnown
    ? { points: coverPoints.knownTherapist, words: "another therapist, who knows the patient" }
    : { points: coverPoints.newTherapist, words: "a new therapist" };
  return visit.isInCourse
    ? [who, { points: coverPoints.courseLeaves, words: "the course changes hands" }]
    : [who];
}

const lengthWords = (minutes: number): string => {
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  return [hours > 0 ? `${hours} h` : "", rest > 0 ? `${rest} min` : ""].filter(Boolean).join(" ");
};

function timePart({ days, minutes }: CoverChange): Part[] {
  const off = Math.abs(minutes);
  const shift = off === 0 ? "" : `${lengthWords(off)} ${minutes > 0 ? "later" : "earlier"}`;
  if (days === 0)
    return off === 0 ? [] : [{ points: Math.ceil(off / 5) * coverPoints.fiveMinutes, words: shift }];
  const dayPoints = coverPoints.otherDay + (days - 1) * coverPoints.furtherDay;
  const clockPoints = Math.ceil(off / 15) * coverPoints.quarterOnOtherDay;
  const when = days === 1 ? "the day after" : `${days} days after`;
  return [
    { points: dayPoints + clockPoints, words: shift === "" ? `${when}, same time` : `${when}, ${shift}` },
  ];
}

/** The points of a change for a visit, and what makes them up, dearest first. */
export function coverCost(visit: CoverVisit, change: CoverChange): { cost: number; reasons: string[] } {
  const borne = [...therapistPart(visit, change), ...timePart(change)];
  if (change.siteId !== visit.siteId) borne.push({ points: coverPoints.otherSite, words: "another site" });
  const people = Math.max(1, visit.patientIds.length);
  const isOtherRoom = change.roomId !== visit.roomId;
  const cost = borne.reduce((sum, p) => sum + p.points * people, isOtherRoom ? coverPoints.otherRoom : 0);
  const reasons = borne.sort((a, b) => b.points - a.points).map((p) => p.words);
  if (isOtherRoom && change.siteId === visit.siteId) reasons.push("another room");
  return { cost, reasons };
}
