import type { DayClock } from "./day-clock";
import type { Interval } from "./interval";
import type { GapLeft, RankConcern, Scores, Urgency, Weights } from "./rank-time";
import type { TimeWishes, WishKind } from "./time-wishes";

export interface FindTimesInput {
  readonly now: Date;
  /** Nothing starts before; the caller's earliest date, or now. */
  readonly from: Date;
  /** Nothing starts at or after. Reaches beyond the latest date asked for, so that relaxing it can be weighed. */
  readonly to: Date;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
  /** Length with clean-down of the shortest service on sale: less than this is lost. */
  readonly shortestSellableMinutes: number;
  readonly sites: readonly { readonly id: string; readonly name: string; readonly zone: string }[];
  readonly therapists: readonly { readonly id: string; readonly name: string }[];
  /** Free time of each therapist who gives the service, clean-down room included, sorted and disjoint. */
  readonly free: readonly {
    readonly therapistId: string;
    readonly siteId: string;
    readonly intervals: readonly Interval[];
  }[];
  /** Free time of the rooms of the kind that the service needs, sorted and disjoint. */
  readonly rooms: readonly {
    readonly id: string;
    readonly name: string;
    readonly siteId: string;
    readonly free: readonly Interval[];
    /** Whether it meets what the patient needs of a room; absent means yes. */
    readonly meetsNeeds?: boolean;
  }[];
  readonly wishes: TimeWishes;
  /** Therapists who have seen the patient. */
  readonly seenBy: readonly {
    readonly therapistId: string;
    readonly visits: number;
    readonly isLast: boolean;
  }[];
  /** What counts, most first; goes before the practice's own weights. */
  readonly order?: readonly RankConcern[] | undefined;
  readonly weights?: Weights | undefined;
  readonly urgency?: Urgency | undefined;
  readonly limit: number;
}

/** A start that could be booked, before it is put into words. */
export interface Candidate {
  readonly startsAt: number;
  readonly therapistId: string;
  readonly siteId: string;
  readonly clock: DayClock;
  readonly broken: number;
  readonly left: GapLeft;
  readonly scores: Scores;
  readonly score: number;
}

export interface FoundTime {
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly therapistId: string;
  readonly siteId: string;
  readonly roomId: string;
  readonly meetsEveryWish: boolean;
  readonly score: number;
  /** Out of five. `knows` is null for a patient whom no one has seen. */
  readonly marks: {
    readonly wish: number;
    readonly wait: number;
    readonly knows: number | null;
    readonly day: number;
  };
  readonly reasons: readonly string[];
  readonly drawbacks: readonly string[];
}

export interface FoundTimes {
  readonly times: readonly FoundTime[];
  readonly lookedAt: number;
  /** How many of all the times looked at meet every wish. */
  readonly meetingEveryWish: number;
  /** Why no time meets every wish, and what to give up; null where one does. */
  readonly none: NoTimes | null;
}

/** What a search learns beside its candidates. */
export interface Tally {
  lookedAt: number;
  longestFree: number;
  readonly byBroken: Map<number, { times: number; first: number; siteId: string }>;
  readonly earliestBySite: Map<string, number>;
}

/** Why no time meets every wish, and the one wish that gives the most when it is given up. */
export interface NoTimes {
  readonly kind: "no-therapist" | "no-free-time" | "no-room" | "wishes";
  readonly message: string;
  readonly relax: { readonly wish: WishKind; readonly times: number; readonly message: string } | null;
}
