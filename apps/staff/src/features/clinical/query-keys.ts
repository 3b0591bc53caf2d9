export const clinicalKeys = {
  all: ["clinical"] as const,
  day: (day: string | undefined) => ["clinical", "day", day] as const,
  unsigned: ["clinical", "unsigned"] as const,
  /** Apart from the rest: a refetch must never run under someone's writing. */
  note: (noteId: string) => ["clinical-note", noteId] as const,
  episodes: (patientId: string) => ["clinical", "episodes", patientId] as const,
  episode: (episodeId: string) => ["clinical", "episode", episodeId] as const,
  measures: (episodeId: string) => ["clinical", "measures", episodeId] as const,
};
