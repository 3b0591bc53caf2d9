/** Under the diary's own key, so that a change made there is seen here. */
export const todayKeys = {
  all: ["diary"] as const,
  pulse: (siteIds: readonly string[]) => ["diary-pulse", siteIds] as const,
  today: (siteIds: readonly string[]) => ["diary", "today", siteIds] as const,
};
