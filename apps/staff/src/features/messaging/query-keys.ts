import type { MessageFilters } from "./api-client";

export const messageKeys = {
  all: ["messages"] as const,
  list: (filters: MessageFilters) => ["messages", filters] as const,
};
