import type {
  CreateProgrammeInput,
  ExerciseLibraryView,
  ExerciseSearchInput,
  ProgrammesOfPatient,
  ProgrammeView,
  SaveProgrammeInput,
} from "@withy/contracts/programmes";
import { get, write } from "@/api/request";

const programmeAt = (id: string) => `/api/clinical/programmes/${id}`;

export const fetchLibrary = (filter: ExerciseSearchInput, signal?: AbortSignal) =>
  get<ExerciseLibraryView>("/api/clinical/exercises", { ...filter }, signal);

export const fetchProgrammes = (patientId: string, signal?: AbortSignal) =>
  get<ProgrammesOfPatient>("/api/clinical/programmes", { patientId }, signal);

export const fetchProgramme = (programmeId: string, signal?: AbortSignal) =>
  get<ProgrammeView>(programmeAt(programmeId), {}, signal);

export const createProgramme = (input: CreateProgrammeInput, key: string) =>
  write<ProgrammeView>("POST", "/api/clinical/programmes", input, key);

export const saveProgramme = ({ programmeId, ...body }: SaveProgrammeInput) =>
  write<ProgrammeView>("PUT", programmeAt(programmeId), body);

export const issueProgramme = (
  { programmeId, version }: { programmeId: string; version: number },
  key: string,
) => write<ProgrammeView>("POST", `${programmeAt(programmeId)}/issue`, { version }, key);

/** Opens beside the page; the address carries no name. */
export const handoutAddress = (programmeId: string, versionNumber: number) =>
  `${programmeAt(programmeId)}/handout?versionNumber=${versionNumber}`;
