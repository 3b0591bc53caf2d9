import { useQuery } from "@tanstack/react-query";
import type { LetterView } from "@withy/contracts/letters";
import { fetchLetter } from "../api-client";
import { letterKeys } from "../query-keys";

/** The letter, first as the page brought it. A draft is read again on return, since the record may have moved on. */
export function useLetter(first: LetterView) {
  return useQuery({
    queryKey: letterKeys.letter(first.id),
    queryFn: ({ signal }) => fetchLetter(first.id, signal),
    initialData: first,
    staleTime: 20_000,
    // While a signed letter is on its way, its delivery is what one waits for.
    refetchInterval: ({ state }) =>
      state.data?.deliveries.some((one) => one.state === "waiting" || one.state === "claimed")
        ? 3_000
        : false,
  });
}
