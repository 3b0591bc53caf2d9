import type { DayFilters } from "./api-client";

/** Every write invalidates `all`: one visit stands in the day, the week, the sheet and among free times. */
export const diaryKeys = {
  all: ["diary"] as const,
  day: (filters: DayFilters) => ["diary", "day", filters] as const,
  pulse: (siteIds: readonly string[]) => ["diary-pulse", siteIds] as const,
  week: (therapistId: string, day: string | undefined) => ["diary", "week", therapistId, day] as const,
  appointment: (id: string) => ["diary", "appointment", id] as const,
  times: (wishes: object) => ["diary", "times", wishes] as const,
  course: (id: string) => ["diary", "course", id] as const,
  proposal: (query: object) => ["diary", "course-proposal", query] as const,
  choices: ["diary-choices"] as const,
  cover: (planId: string) => ["diary-cover", planId] as const,
  coverPlaces: (planId: string, version: number, moveId: string) =>
    ["diary-cover", planId, version, moveId] as const,
  changes: (siteIds: readonly string[]) => ["diary", "changes", siteIds] as const,
};
