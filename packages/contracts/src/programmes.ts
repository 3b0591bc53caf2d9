import {
  type Exercise,
  equipment,
  regions,
  supports,
  trainingKinds,
} from "@withy/clinical/exercises/exercise";
import { itemSides, lastRests, type Programme, programmeModes } from "@withy/clinical/programmes/programme";
import { z } from "zod";
import type { ClinicalPatient } from "./clinical";
import { idField, requiredText, versionField } from "./fields";

const keyField = z.string().min(1).max(60);
const whole = z.int("Enter a whole number.");
const formRef = z.strictObject({ exercise: keyField, form: keyField });

/** Shapes only: the programme's own rule names the line that is wrong and what to do. */
export const programmeItemInput = z.strictObject({
  id: keyField,
  exercise: keyField,
  form: keyField,
  side: z.enum(itemSides),
  support: z.enum(supports).nullable(),
  workSeconds: whole,
  restSeconds: whole,
  sets: whole,
  repetitions: whole,
  repetitionSeconds: whole,
  holdSeconds: whole,
  restBetweenSetsSeconds: whole,
  note: z.string().trim().max(300, "Keep the note to 300 characters."),
  insteadOf: formRef.nullable(),
});

export const programmeContent = z.strictObject({
  mode: z.enum(programmeModes),
  rounds: whole,
  restBetweenRoundsSeconds: whole,
  lastRest: z.enum(lastRests),
  restBetweenItemsSeconds: whole,
  sessionsPerWeek: whole,
  equipmentMissing: z.array(z.enum(equipment)).max(equipment.length),
  advice: z.string().trim().max(1000, "Keep the advice to 1,000 characters."),
  items: z.array(programmeItemInput).max(60, "Keep to 30 lines or fewer."),
});

const titleField = requiredText(120, "Give the programme a name.");

export const createProgrammeInput = z.strictObject({
  episodeId: idField,
  title: titleField.optional(),
  /** Starts from the last version of another programme of the same patient. */
  copyOf: idField.optional(),
});
export type CreateProgrammeInput = z.input<typeof createProgrammeInput>;

export const saveProgrammeInput = z.strictObject({
  programmeId: idField,
  version: versionField,
  title: titleField,
  content: programmeContent,
});
export type SaveProgrammeInput = z.input<typeof saveProgrammeInput>;

export const issueProgrammeInput = z.strictObject({ programmeId: idField, version: versionField });

export const listProgrammesInput = z.strictObject({ patientId: idField });

export const programmeVersionInput = z.strictObject({
  programmeId: idField,
  /** Absent: the one that is worked on. */
  versionNumber: z.coerce.number().int().positive().optional(),
});

export const exerciseSearchInput = z.strictObject({
  words: z.string().trim().max(80, "Use 80 characters or fewer.").optional(),
  region: z.enum(regions).optional(),
  kind: z.enum(trainingKinds).optional(),
  /** "none": only what needs no equipment at all. */
  equipment: z.enum(["any", "none"]).default("any"),
});
export type ExerciseSearchInput = z.input<typeof exerciseSearchInput>;

export const exerciseKeyInput = z.strictObject({ key: keyField });

export interface ExerciseLibraryView {
  readonly exercises: readonly Exercise[];
  /** Of the whole library. */
  readonly total: number;
}

export interface ExerciseView extends Exercise {
  /** The exercises whose ladders meet this one's ends. */
  readonly harderExercise: { readonly key: string; readonly name: string } | null;
  readonly easierExercises: readonly { readonly key: string; readonly name: string }[];
  /** "Squat, a quarter of the way": what to do with nothing at home; null where no form needs anything. */
  readonly alternativeName: string | null;
}

export interface ProgrammeVersionLine {
  readonly versionNumber: number;
  readonly savedAt: string;
  readonly savedBy: string;
  readonly issuedAt: string | null;
  readonly issuedBy: string | null;
}

export interface ProgrammeLine {
  readonly id: string;
  readonly title: string;
  readonly episodeId: string;
  /** "Left hip". */
  readonly place: string;
  readonly problem: string;
  readonly currentVersion: number;
  readonly exercises: number;
  readonly sessionSeconds: number;
  readonly sessionsPerWeek: number;
  readonly updatedAt: string;
  readonly lastIssuedAt: string | null;
}

export interface ProgrammeView {
  readonly id: string;
  readonly title: string;
  readonly patient: ClinicalPatient;
  /** What the handout calls the patient. */
  readonly calledName: string;
  readonly episode: {
    readonly id: string;
    readonly problem: string;
    readonly place: string;
    readonly isOpen: boolean;
  };
  readonly sender: { readonly practice: string; readonly site: string; readonly phone: string };
  readonly zone: string;
  /** The one shown; only the current one can be changed. */
  readonly versionNumber: number;
  readonly currentVersion: number;
  readonly isIssued: boolean;
  readonly canWrite: boolean;
  readonly content: Programme;
  readonly sessionSeconds: number;
  readonly weekSeconds: number;
  readonly versions: readonly ProgrammeVersionLine[];
  /** The row's version, to send with the next save. */
  readonly version: number;
}

export interface ProgrammesOfPatient {
  readonly patient: ClinicalPatient;
  readonly programmes: readonly ProgrammeLine[];
  readonly openEpisodes: readonly { readonly id: string; readonly problem: string; readonly place: string }[];
  readonly canWrite: boolean;
}
