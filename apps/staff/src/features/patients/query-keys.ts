import type { TimelineKind } from "@withy/contracts/patients";

export const patientKeys = {
  all: ["patients"] as const,
  list: (search: string, page: number) => ["patients", "list", search, page] as const,
  timeline: (patientId: string, kind: TimelineKind) => ["patients", "timeline", patientId, kind] as const,
  looks: (patientId: string, page: number) => ["patients", "looks", patientId, page] as const,
};
