import type {
  HeldTime,
  holdTimeInput,
  OtherPerson,
  PutAsideItem,
  putAsideInput,
  SavedView,
  saveViewInput,
} from "@withy/contracts/diary";
import type { z } from "zod";
import { get, write } from "@/api/request";
import { liveKeys } from "@/components/use-live-diary";

export type HoldTime = z.input<typeof holdTimeInput>;
export type PutAside = z.input<typeof putAsideInput>;
export type SaveView = z.input<typeof saveViewInput>;

export const deskKeys = {
  holds: (siteIds: readonly string[]) => [...liveKeys.holds, siteIds] as const,
  presence: liveKeys.presence,
  aside: ["diary-aside"] as const,
  views: ["diary-views"] as const,
};

export const fetchHolds = (siteIds: readonly string[], signal?: AbortSignal) =>
  get<readonly HeldTime[]>("/api/diary/holds", { siteIds }, signal);

export const holdTime = (input: HoldTime) => write<unknown>("PUT", "/api/diary/hold", input);

export const releaseHold = () => write<unknown>("DELETE", "/api/diary/hold");

const presence = (appointmentId: string) => `/api/diary/appointments/${appointmentId}/presence`;

export const fetchPresence = (appointmentId: string, signal?: AbortSignal) =>
  get<readonly OtherPerson[]>(presence(appointmentId), {}, signal);

export const showPresence = (appointmentId: string, isEditing: boolean) =>
  write<unknown>("PUT", presence(appointmentId), { isEditing });

export const endPresence = (appointmentId: string) => write<unknown>("DELETE", presence(appointmentId));

export const fetchPutAside = (signal?: AbortSignal) =>
  get<readonly PutAsideItem[]>("/api/diary/put-aside", {}, signal);

export const putAside = (input: PutAside) =>
  write<{ id: string; time: string }>("POST", "/api/diary/put-aside", input);

export const removePutAside = (itemId: string) =>
  write<{ id: string }>("DELETE", `/api/diary/put-aside/${itemId}`);

export const fetchViews = (signal?: AbortSignal) => get<readonly SavedView[]>("/api/diary/views", {}, signal);

export const saveView = (input: SaveView) => write<unknown>("POST", "/api/diary/views", input);

export const removeView = (viewId: string) => write<unknown>("DELETE", `/api/diary/views/${viewId}`);
