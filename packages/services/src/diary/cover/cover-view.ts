import type { CoverMoveView, CoverPlaceView, CoverPlanView } from "@withy/contracts/diary";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { appointments, jobs, patients, rooms, services, sites, staffMembers } from "@withy/db/schema";
import type { CandidatePlace } from "@withy/diary/cover/cover-problem";
import { and, eq, inArray } from "drizzle-orm";
import type { Context } from "../../context";
import { jobView } from "../../messaging/job-view";
import { changesForPatient, isPlaced, loadPlan, type MoveRow, outcomeOf, type PlanRow } from "./cover-rows";
import { undoMinutes } from "./undo-minutes";

/** The names of everywhere and everyone, for places in words. */
export interface PlaceNames {
  readonly sites: ReadonlyMap<string, { readonly name: string; readonly zone: string }>;
  readonly therapists: ReadonlyMap<string, string>;
  readonly rooms: ReadonlyMap<string, string>;
}

export async function readPlaceNames(ctx: Context): Promise<PlaceNames> {
  const { db, practiceId } = ctx;
  const [siteRows, people, roomRows] = await Promise.all([
    db
      .select({ id: sites.id, name: sites.name, zone: sites.zone })
      .from(sites)
      .where(eq(sites.practiceId, practiceId)),
    db
      .select({ id: staffMembers.id, given: staffMembers.givenName, family: staffMembers.familyName })
      .from(staffMembers)
      .where(eq(staffMembers.practiceId, practiceId)),
    db.select({ id: rooms.id, name: rooms.name }).from(rooms).where(eq(rooms.practiceId, practiceId)),
  ]);
  return {
    sites: new Map(siteRows.map((s) => [s.id, s] as const)),
    therapists: new Map(people.map((p) => [p.id, `${p.given} ${p.family}`] as const)),
    rooms: new Map(roomRows.map((r) => [r.id, r.name] as const)),
  };
}

export const zoneAt = (ctx: Context, names: PlaceNames, siteId: string): string =>
  names.sites.get(siteId)?.zone ?? ctx.zone;

export function placeView(
  ctx: Context,
  names: PlaceNames,
  place: Omit<CandidatePlace, "startsAt"> & { startsAt: Date },
): CoverPlaceView {
  const zone = zoneAt(ctx, names, place.siteId);
  return {
    startsAt: place.startsAt.toISOString(),
    day: dayOf(place.startsAt, zone),
    startTime: timeOf(place.startsAt, zone),
    site: { id: place.siteId, name: names.sites.get(place.siteId)?.name ?? "" },
    therapist: { id: place.therapistId, name: names.therapists.get(place.therapistId) ?? "" },
    room: { id: place.roomId, name: names.rooms.get(place.roomId) ?? "" },
    cost: place.cost,
    reasons: place.reasons,
  };
}

interface VisitNames {
  id: string;
  patientId: string;
  given: string;
  family: string;
  phone: string | null;
  email: string | null;
  service: string;
}

function readVisitNames(ctx: Context, ids: readonly string[]): Promise<VisitNames[]> {
  if (ids.length === 0) return Promise.resolve([]);
  return ctx.db
    .select({
      id: appointments.id,
      patientId: patients.id,
      given: patients.givenName,
      family: patients.familyName,
      phone: patients.phone,
      email: patients.email,
      service: services.name,
    })
    .from(appointments)
    .innerJoin(
      patients,
      and(eq(patients.practiceId, appointments.practiceId), eq(patients.id, appointments.patientId)),
    )
    .innerJoin(
      services,
      and(eq(services.practiceId, appointments.practiceId), eq(services.id, appointments.serviceId)),
    )
    .where(and(eq(appointments.practiceId, ctx.practiceId), inArray(appointments.id, [...ids])));
}

function tellingOf(move: MoveRow, hasAddress: boolean): CoverMoveView["tells"] {
  if (move.decision === "phone" || !isPlaced(move)) return "ring";
  if (!changesForPatient(move)) return "nobody";
  return hasAddress ? "message" : "ring";
}

function moveView(ctx: Context, names: PlaceNames, move: MoveRow, visit: VisitNames): CoverMoveView {
  const view = (place: NonNullable<MoveRow["place"]>): CoverPlaceView =>
    placeView(ctx, names, { ...place, startsAt: new Date(place.startsAt) });
  const hasAddress = visit.email !== null && visit.email !== "";
  return {
    id: move.id,
    appointmentId: move.appointmentId,
    patient: { id: visit.patientId, name: `${visit.given} ${visit.family}`, phone: visit.phone },
    serviceName: visit.service,
    before: view(move.before),
    place: move.place && view(move.place),
    problem: move.problem,
    decision: move.decision,
    tells: tellingOf(move, hasAddress),
    isApplied: move.isApplied === 1,
  };
}

async function jobOf(ctx: Context, plan: PlanRow): Promise<CoverPlanView["job"]> {
  if (plan.state !== "solving" || plan.jobId === null) return null;
  const [row] = await ctx.db
    .select()
    .from(jobs)
    .where(and(eq(jobs.practiceId, ctx.practiceId), eq(jobs.id, plan.jobId)));
  if (!row) return null;
  const { state, progressDone, progressTotal, problem } = jobView(row, () => null);
  return { state, done: progressDone, total: progressTotal, problem };
}

function undoUntil(ctx: Context, plan: PlanRow): string | null {
  if (plan.state !== "applied" || plan.appliedAt === null) return null;
  const until = new Date(plan.appliedAt.getTime() + undoMinutes * 60_000);
  return until > ctx.clock.now() ? until.toISOString() : null;
}

/** A plan as it stands, for who may book at every site that it touches. */
export async function readPlanView(ctx: Context, planId: string): Promise<CoverPlanView> {
  const { plan, moves } = await loadPlan(ctx, planId);
  const [names, visits, job] = await Promise.all([
    readPlaceNames(ctx),
    readVisitNames(
      ctx,
      moves.map((m) => m.appointmentId),
    ),
    jobOf(ctx, plan),
  ]);
  const byId = new Map(visits.map((v) => [v.id, v] as const));
  const causeId = plan.therapistId ?? plan.roomId ?? "";
  const kind = plan.therapistId === null ? "room" : "therapist";
  const name = (kind === "room" ? names.rooms : names.therapists).get(causeId) ?? "";
  const zone = ctx.zone;
  const { absenceId: _absence, ...outcome } = outcomeOf(plan) ?? {};
  return {
    ...{ id: plan.id, version: plan.version, state: plan.state, reason: plan.reason, zone, job },
    cause: { kind, id: causeId, name },
    startDay: dayOf(plan.startsAt, zone),
    startTime: timeOf(plan.startsAt, zone),
    endDay: dayOf(plan.endsAt, zone),
    endTime: timeOf(plan.endsAt, zone),
    outcome: plan.outcome === null ? null : (outcome as CoverPlanView["outcome"]),
    moves: moves
      .flatMap((m) => {
        const visit = byId.get(m.appointmentId);
        return visit ? [moveView(ctx, names, m, visit)] : [];
      })
      .sort((a, b) => a.before.startsAt.localeCompare(b.before.startsAt)),
    undoUntil: undoUntil(ctx, plan),
  };
}
