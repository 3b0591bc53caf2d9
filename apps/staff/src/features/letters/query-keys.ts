import type { LetterFilters } from "./api-client";

export const letterKeys = {
  all: ["letters"] as const,
  lists: ["letters", "list"] as const,
  list: (filters: LetterFilters) => ["letters", "list", filters] as const,
  letter: (id: string) => ["letters", "letter", id] as const,
};
