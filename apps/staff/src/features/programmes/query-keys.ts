import type { ExerciseSearchInput } from "@withy/contracts/programmes";

export const programmeKeys = {
  library: (filter: ExerciseSearchInput) => ["exercises", filter] as const,
  ofPatient: (patientId: string) => ["programmes", patientId] as const,
};
