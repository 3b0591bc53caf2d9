import type { ProgrammeItem } from "@withy/clinical/programmes/programme";

/** What can be done to one line of the programme. */
export interface ItemActions {
  choose: (id: string | null) => void;
  change: (id: string, change: Partial<ProgrammeItem>) => void;
  climb: (id: string, way: "easier" | "harder") => void;
  /** To the place of another line, counted from 0. */
  move: (id: string, to: number) => void;
  remove: (id: string) => void;
}

/** The one dialog that is open over the builder. */
export type BuilderSheet = "add" | "equipment" | "session" | "issue" | null;
