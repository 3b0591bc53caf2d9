import { draftDischargeLetter } from "../api-client";
import { useLetterWrite } from "./use-letter-write";

export function useDraftLetter() {
  return useLetterWrite(draftDischargeLetter);
}
