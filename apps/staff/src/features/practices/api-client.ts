import type { AuditPage, ListAuditInput } from "@withy/contracts/audit";
import type {
  ChangeDiarySettingsInput,
  ChangeFindingWeightsInput,
  DiarySettingsView,
  MyCalendarFeedView,
  NewCalendarFeedView,
} from "@withy/contracts/diary";
import type {
  ApiKeyRow,
  ChangeRolesInput,
  DeactivatedView,
  InviteStaffMemberInput,
  MakeApiKeyInput,
  NewApiKeyView,
  SessionRow,
  StaffRow,
} from "@withy/contracts/practices";
import type { Weights } from "@withy/diary/rank-time";
import { get, write } from "@/api/request";

export const listMySessions = (signal?: AbortSignal) =>
  get<SessionRow[]>("/api/practices/account/sessions", {}, signal);

export const endSession = (sessionId: string) =>
  write<{ sessionId: string }>("DELETE", `/api/practices/account/sessions/${sessionId}`);

export const endAllSessions = () =>
  write<{ ended: number }>("POST", "/api/practices/account/sessions/end-all");

export const changePassword = (input: { currentPassword: string; password: string }) =>
  write<{ endedSessions: number }>("POST", "/api/practices/account/password", input);

export const listStaff = (signal?: AbortSignal) => get<StaffRow[]>("/api/practices/staff", {}, signal);

export const inviteStaffMember = (input: InviteStaffMemberInput, idempotencyKey: string) =>
  write<{ staffMemberId: string }>("POST", "/api/practices/staff", input, idempotencyKey);

export const changeRoles = ({ staffMemberId, ...input }: ChangeRolesInput) =>
  write<{ staffMemberId: string }>("PUT", `/api/practices/staff/${staffMemberId}/roles`, input);

export const deactivateStaff = (staffMemberId: string) =>
  write<DeactivatedView>("POST", `/api/practices/staff/${staffMemberId}/deactivate`);

export const reactivateStaff = (staffMemberId: string) =>
  write<{ staffMemberId: string }>("POST", `/api/practices/staff/${staffMemberId}/reactivate`);

export const sendInvitationAgain = (staffMemberId: string) =>
  write<{ staffMemberId: string }>("POST", `/api/practices/staff/${staffMemberId}/invite`);

export const listAudit = (filter: ListAuditInput, signal?: AbortSignal) =>
  get<AuditPage>("/api/audit", { ...filter } as Record<string, string | number>, signal);

export const changeDiarySettings = (input: ChangeDiarySettingsInput) =>
  write<DiarySettingsView>("PUT", "/api/diary/settings", input);

export const makeCalendarFeed = () => write<NewCalendarFeedView>("POST", "/api/diary/feed");

export const revokeCalendarFeed = () => write<MyCalendarFeedView>("DELETE", "/api/diary/feed");

export const makeApiKey = (input: MakeApiKeyInput) =>
  write<NewApiKeyView>("POST", "/api/practices/api-keys", input);

export const revokeApiKey = (apiKeyId: string) =>
  write<ApiKeyRow[]>("DELETE", `/api/practices/api-keys/${apiKeyId}`);

export const changeFindingWeights = (input: ChangeFindingWeightsInput) =>
  write<Weights>("PUT", "/api/diary/finding-weights", input);
