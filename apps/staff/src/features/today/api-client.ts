import type {
  AppointmentView,
  DiaryPulseView,
  markAppointmentInput,
  TodayView,
} from "@withy/contracts/diary";
import type { z } from "zod";
import { get, write } from "@/api/request";

export type MarkArrival = z.input<typeof markAppointmentInput>;

export const fetchToday = (siteIds: readonly string[], signal?: AbortSignal) =>
  get<TodayView>("/api/diary/today", { siteIds }, signal);

export const fetchPulse = (siteIds: readonly string[], signal?: AbortSignal) =>
  get<DiaryPulseView>("/api/diary/pulse", { siteIds }, signal);

export const markArrival = ({ appointmentId, ...input }: MarkArrival) =>
  write<AppointmentView>("POST", `/api/diary/appointments/${appointmentId}/mark`, input);

export const undoArrival = (view: AppointmentView) =>
  write<AppointmentView>("POST", `/api/diary/appointments/${view.id}/undo-mark`, { version: view.version });
