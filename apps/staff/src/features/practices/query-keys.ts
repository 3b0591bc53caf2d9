import type { ListAuditInput } from "@withy/contracts/audit";

export const practiceKeys = {
  sessions: ["practices", "sessions"] as const,
  staff: ["practices", "staff"] as const,
  audit: (filter: ListAuditInput) => ["audit", filter] as const,
};
