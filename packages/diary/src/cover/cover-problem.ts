import type { Interval } from "../interval";

/** A visit, or a class with everyone on its list, that must leave its place. Instants are milliseconds since the epoch. */
export interface CoverVisit {
  readonly id: string;
  /** One patient; or the attendees of a class, who stay together. */
  readonly patientIds: readonly string[];
  readonly startsAt: number;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
  readonly siteId: string;
  readonly therapistId: string;
  readonly roomId: string;
  /** Who gives the service. */
  readonly therapistIds: readonly string[];
  readonly roomKind: string;
  readonly needsEquipment: readonly string[];
  /** Therapists who have treated the patient before. */
  readonly seenBy: readonly string[];
  readonly isInCourse: boolean;
}

/** One therapist's hours at one site, and what has gone of them. */
export interface CoverLane {
  readonly therapistId: string;
  readonly siteId: string;
  /** Working hours less breaks, sorted and disjoint. */
  readonly working: readonly Interval[];
  /** Visits that stand, classes, leave, and the way to another site. Without the visits to be moved. */
  readonly taken: readonly Interval[];
}

export interface CoverRoom {
  readonly id: string;
  readonly siteId: string;
  readonly kind: string;
  readonly equipment: readonly string[];
  /** Sorted and disjoint. */
  readonly free: readonly Interval[];
}

/** Everything that decides where the visits may go. The absence itself is in `taken` or in the room's `free`. */
export interface CoverProblem {
  readonly now: number;
  /** A patient whose time changes must hear of it: no new time starts sooner than so many minutes from now. */
  readonly noticeMinutes: number;
  /** How many days after its own day a visit may go. */
  readonly daysAfter: number;
  readonly visits: readonly CoverVisit[];
  readonly sites: readonly { readonly id: string; readonly zone: string }[];
  readonly lanes: readonly CoverLane[];
  readonly rooms: readonly CoverRoom[];
  /** Other visits of the patients. */
  readonly patientBusy: ReadonlyMap<string, readonly Interval[]>;
}

/** A place where a visit could go: nothing that stands is in its way. */
export interface CandidatePlace {
  readonly startsAt: number;
  readonly therapistId: string;
  readonly siteId: string;
  readonly roomId: string;
  /** In points of the cost rule; whole. */
  readonly cost: number;
  readonly reasons: readonly string[];
}

export const visitNeedMs = (visit: CoverVisit): number =>
  (visit.durationMinutes + visit.cleanDownMinutes) * 60_000;
