import type {
  LetterRow,
  LetterView,
  ListLettersInput,
  SaveLetterInput,
  SendLetterInput,
  SettleSentenceInput,
  SignLetterInput,
} from "@withy/contracts/letters";
import type { Page } from "@withy/contracts/page";
import { get, write } from "@/api/request";

export type LetterFilters = Omit<ListLettersInput, "pageSize" | "page"> & { page?: number };

const letter = (id: string) => `/api/letters/${id}`;

export const letterPdfAddress = (id: string) => `${letter(id)}/pdf`;

export const fetchLetters = (filters: LetterFilters, signal?: AbortSignal) =>
  get<Page<LetterRow>>("/api/letters", { ...filters }, signal);

export const fetchLetter = (id: string, signal?: AbortSignal) => get<LetterView>(letter(id), {}, signal);

export const draftDischargeLetter = (episodeId: string) =>
  write<LetterView>("POST", "/api/letters", { episodeId });

export const saveLetter = ({ letterId, ...input }: SaveLetterInput) =>
  write<LetterView>("PUT", letter(letterId), input);

export const settleSentence = ({ letterId, ...input }: SettleSentenceInput) =>
  write<LetterView>("POST", `${letter(letterId)}/sentences`, input);

export const signLetter = ({ letterId, ...input }: SignLetterInput) =>
  write<LetterView>("POST", `${letter(letterId)}/sign`, input);

export const sendLetter = ({ letterId, ...input }: SendLetterInput, key: string) =>
  write<LetterView>("POST", `${letter(letterId)}/send`, input, key);
