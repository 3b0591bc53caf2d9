import type {
  CoverPlaceView,
  CoverPlanView,
  decideCoverMoveInput,
  planCoverInput,
} from "@withy/contracts/diary";
import type { z } from "zod";
import { get, write } from "@/api/request";

export type PlanCover = z.input<typeof planCoverInput>;
export type DecideCoverMove = z.input<typeof decideCoverMoveInput>;

const plan = (id: string) => `/api/diary/cover/${id}`;

export const planCover = (input: PlanCover, key: string) =>
  write<CoverPlanView>("POST", "/api/diary/cover", input, key);

export const fetchCoverPlan = (id: string, signal?: AbortSignal) => get<CoverPlanView>(plan(id), {}, signal);

export const fetchCoverPlaces = (planId: string, moveId: string, signal?: AbortSignal) =>
  get<readonly CoverPlaceView[]>(`${plan(planId)}/moves/${moveId}/places`, {}, signal);

export const decideCoverMove = ({ coverPlanId, coverMoveId, ...input }: DecideCoverMove) =>
  write<CoverPlanView>("POST", `${plan(coverPlanId)}/moves/${coverMoveId}`, input);

export const applyCoverPlan = ({ id, version }: CoverPlanView) =>
  write<CoverPlanView>("POST", `${plan(id)}/apply`, { version });

export const undoCoverPlan = ({ id, version }: CoverPlanView) =>
  write<CoverPlanView>("POST", `${plan(id)}/undo`, { version });
