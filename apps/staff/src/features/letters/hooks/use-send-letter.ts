import type { SendLetterInput } from "@withy/contracts/letters";
import { useRef } from "react";
import { sendLetter } from "../api-client";
import { useLetterWrite } from "./use-letter-write";

/** One key for each wording: pressing twice sends once, another reader or another press later is a new sending. */
export function useSendLetter() {
  const keys = useRef(new Map<string, string>());
  const keyOf = (input: SendLetterInput) => {
    const wording = JSON.stringify(input);
    const key = keys.current.get(wording) ?? crypto.randomUUID();
    keys.current.set(wording, key);
    return key;
  };
  const write = useLetterWrite((input: SendLetterInput) => sendLetter(input, keyOf(input)));
  return { ...write, forget: () => keys.current.clear() };
}
