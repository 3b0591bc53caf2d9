/** Under the diary's own key, so that a change made there is seen here. */
export const todayKeys = {
  all: ["diary"] as const,
  today: (siteIds: readonly string[]) => ["diary", "today", siteIds] as const,
};
