import type {
  addWaitingEntryInput,
  editWaitingEntryInput,
  FreedTimeRow,
  OfferRoundView,
  offerTimeInput,
  VisitAhead,
  WaitingRow,
} from "@withy/contracts/diary";
import type { Page } from "@withy/contracts/page";
import type { z } from "zod";
import { get, write } from "@/api/request";

export interface WaitingFilters {
  siteId?: string | undefined;
  urgency?: string | undefined;
  page: number;
}
export type AddWaiting = z.input<typeof addWaitingEntryInput>;
export type EditWaiting = z.input<typeof editWaitingEntryInput>;
export type OfferTime = z.input<typeof offerTimeInput>;

/** Kept apart from the diary's own keys: an offer that is answered changes both, the list alone only these. */
export const waitingKeys = {
  all: ["waiting"] as const,
  list: (filters: WaitingFilters) => ["waiting", "list", filters] as const,
  rounds: ["waiting", "rounds"] as const,
  freed: ["waiting", "freed"] as const,
  visits: (patientId: string) => ["waiting", "visits", patientId] as const,
};

export const fetchWaiting = (filters: WaitingFilters, signal?: AbortSignal) =>
  get<Page<WaitingRow>>("/api/diary/waiting", { ...filters }, signal);

export const fetchRounds = (signal?: AbortSignal) =>
  get<readonly OfferRoundView[]>("/api/diary/offers", {}, signal);

export const fetchFreedTimes = (signal?: AbortSignal) =>
  get<readonly FreedTimeRow[]>("/api/diary/freed-times", {}, signal);

export const fetchVisitsAhead = (patientId: string, signal?: AbortSignal) =>
  get<readonly VisitAhead[]>("/api/diary/waiting/visits-ahead", { patientId }, signal);

export const addWaiting = (input: AddWaiting, key: string) =>
  write<{ entryId: string }>("POST", "/api/diary/waiting", input, key);

export const editWaiting = ({ entryId, ...input }: EditWaiting) =>
  write<{ entryId: string }>("PUT", `/api/diary/waiting/${entryId}`, input);

export const withdrawWaiting = ({ entryId, version }: { entryId: string; version: number }) =>
  write<{ entryId: string }>("POST", `/api/diary/waiting/${entryId}/withdraw`, { version });

export const offerTime = (input: OfferTime, key: string) =>
  write<{ roundId: string }>("POST", "/api/diary/offers", input, key);

export const stopRound = ({ roundId, version }: { roundId: string; version: number }) =>
  write<OfferRoundView>("POST", `/api/diary/offers/${roundId}/stop`, { version });
