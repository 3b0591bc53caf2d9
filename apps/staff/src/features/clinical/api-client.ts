import type {
  AddAddendumInput,
  DayList,
  DischargeEpisodeInput,
  EpisodeSummary,
  EpisodeView,
  MeasureSeriesView,
  NoteView,
  OpenEpisodeInput,
  RecordedMeasure,
  RecordMeasureInput,
  RecordRedFlagsInput,
  SavedNote,
  SaveNoteDraftInput,
  SignNoteInput,
  StartNoteInput,
  UnsignedItem,
} from "@withy/contracts/clinical";
import { get, write } from "@/api/request";

const episodeAt = (id: string) => `/api/clinical/episodes/${id}`;
const noteAt = (id: string) => `/api/clinical/notes/${id}`;

export const fetchDayList = (day: string | undefined, signal?: AbortSignal) =>
  get<DayList>("/api/clinical/day", { day }, signal);
export const fetchUnsigned = (signal?: AbortSignal) =>
  get<UnsignedItem[]>("/api/clinical/notes/unsigned", {}, signal);
export const fetchNote = (noteId: string, signal?: AbortSignal) => get<NoteView>(noteAt(noteId), {}, signal);
export const fetchEpisodes = (patientId: string, signal?: AbortSignal) =>
  get<EpisodeSummary[]>("/api/clinical/episodes", { patientId }, signal);
export const fetchEpisode = (episodeId: string, signal?: AbortSignal) =>
  get<EpisodeView>(episodeAt(episodeId), {}, signal);
export const fetchMeasures = (episodeId: string, signal?: AbortSignal) =>
  get<MeasureSeriesView[]>(`${episodeAt(episodeId)}/measures`, {}, signal);

export const startNote = (input: StartNoteInput) => write<NoteView>("POST", "/api/clinical/notes", input);
export const saveNoteDraft = ({ noteId, ...body }: SaveNoteDraftInput) =>
  write<SavedNote>("PUT", `${noteAt(noteId)}/draft`, body);
export const signNote = ({ noteId, ...body }: SignNoteInput) =>
  write<NoteView>("POST", `${noteAt(noteId)}/sign`, body);
export const addAddendum = ({ noteId, ...body }: AddAddendumInput, key: string) =>
  write<NoteView>("POST", `${noteAt(noteId)}/addenda`, body, key);

export const openEpisode = (input: OpenEpisodeInput, key: string) =>
  write<EpisodeView>("POST", "/api/clinical/episodes", input, key);
export interface SaveGoals {
  episodeId: string;
  version: number;
  goals: { text: string; isMet: boolean }[];
}
export const saveGoals = ({ episodeId, ...body }: SaveGoals) =>
  write<EpisodeView>("PUT", `${episodeAt(episodeId)}/goals`, body);
export const recordRedFlags = ({ episodeId, ...body }: RecordRedFlagsInput) =>
  write<EpisodeView>("PUT", `${episodeAt(episodeId)}/red-flags`, body);
export const dischargeEpisode = ({ episodeId, ...body }: DischargeEpisodeInput) =>
  write<EpisodeView>("POST", `${episodeAt(episodeId)}/discharge`, body);
export const reopenEpisode = ({ episodeId, version }: { episodeId: string; version: number }) =>
  write<EpisodeView>("POST", `${episodeAt(episodeId)}/reopen`, { version });
export const recordMeasure = ({ episodeId, ...body }: RecordMeasureInput, key: string) =>
  write<RecordedMeasure>("POST", `${episodeAt(episodeId)}/measures`, body, key);
