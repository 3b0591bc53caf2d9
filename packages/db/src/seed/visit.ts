import type { AppointmentStateCode } from "../schema";
import type { EpisodeRow, PatientRow, PersonRow, RoomRow, ServiceRow, SiteRow } from "./stage";

/** One course of care while the diary is being made up. */
export interface Course {
  readonly patient: PatientRow;
  readonly episode: EpisodeRow;
  readonly therapist: PersonRow;
  readonly site: SiteRow;
  readonly problem: ProblemPlan;
  readonly plannedVisits: number;
  readonly visits: Visit[];
  /** Attended or still to come. */
  kept: number;
  lastDay: string;
  dueOn: string;
}

export interface ProblemPlan {
  readonly problem: string;
  readonly region: string;
  readonly sides: readonly ("left" | "right" | "both" | "none")[];
}

/** One visit of the made-up diary. */
export interface Visit {
  readonly id: string;
  readonly course: Course;
  readonly therapist: PersonRow;
  readonly site: SiteRow;
  readonly room: RoomRow;
  readonly service: ServiceRow;
  readonly day: string;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly bookedAt: Date;
  readonly state: AppointmentStateCode;
  readonly cancelledAt: Date | null;
  readonly isFirst: boolean;
}

export const holdsTime = (visit: Pick<Visit, "state">): boolean => visit.state !== "cancelled";
