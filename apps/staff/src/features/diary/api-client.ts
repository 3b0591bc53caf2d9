import type {
  AppointmentView,
  BookingChoicesView,
  bookAppointmentInput,
  cancelAppointmentInput,
  DiaryDayView,
  DiaryPulseView,
  FoundTimesView,
  markAppointmentInput,
  moveAppointmentInput,
  RecentChange,
  TherapistWeekView,
} from "@withy/contracts/diary";
import type { z } from "zod";
import { get, write } from "@/api/request";

export interface DayFilters {
  day?: string | undefined;
  siteIds: readonly string[];
  by: "therapist" | "room";
}

type Query = Parameters<typeof get>[1];
export type BookAppointment = z.input<typeof bookAppointmentInput>;
export type MoveAppointment = z.input<typeof moveAppointmentInput>;
export type CancelAppointment = z.input<typeof cancelAppointmentInput>;
export type MarkAppointment = z.input<typeof markAppointmentInput>;
export interface AppointmentVersion {
  appointmentId: string;
  version: number;
}

const visit = (id: string) => `/api/diary/appointments/${id}`;

export const fetchDay = (filters: DayFilters, signal?: AbortSignal) =>
  get<DiaryDayView>("/api/diary/day", { ...filters }, signal);

export const fetchPulse = (siteIds: readonly string[], signal?: AbortSignal) =>
  get<DiaryPulseView>("/api/diary/pulse", { siteIds }, signal);

export const fetchWeek = (therapistId: string, day: string | undefined, signal?: AbortSignal) =>
  get<TherapistWeekView>(`/api/diary/therapists/${therapistId}/week`, { day }, signal);

export const fetchAppointment = (id: string, signal?: AbortSignal) =>
  get<AppointmentView>(visit(id), {}, signal);

export const fetchChoices = (signal?: AbortSignal) =>
  get<BookingChoicesView>("/api/diary/choices", {}, signal);

export const fetchTimes = (wishes: NonNullable<Query>, signal?: AbortSignal) =>
  get<FoundTimesView>("/api/diary/times", wishes, signal);

export const bookAppointment = (input: BookAppointment, key: string) =>
  write<AppointmentView>("POST", "/api/diary/appointments", input, key);

export const moveAppointment = ({ appointmentId, ...input }: MoveAppointment) =>
  write<AppointmentView>("POST", `${visit(appointmentId)}/move`, input);

export const cancelAppointment = ({ appointmentId, ...input }: CancelAppointment) =>
  write<AppointmentView>("POST", `${visit(appointmentId)}/cancel`, input);

export const undoCancel = ({ appointmentId, version }: AppointmentVersion) =>
  write<AppointmentView>("POST", `${visit(appointmentId)}/undo-cancel`, { version });

export const markAppointment = ({ appointmentId, ...input }: MarkAppointment) =>
  write<AppointmentView>("POST", `${visit(appointmentId)}/mark`, input);

export const undoMark = ({ appointmentId, version }: AppointmentVersion) =>
  write<AppointmentView>("POST", `${visit(appointmentId)}/undo-mark`, { version });

export const fetchChanges = (siteIds: readonly string[], limit: number, signal?: AbortSignal) =>
  get<readonly RecentChange[]>("/api/diary/changes", { siteIds, limit }, signal);
