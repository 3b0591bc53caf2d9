import { useSearchParams } from "next/navigation";
import { useCallback, useMemo } from "react";
import { type DayAddress, readDayAddress, writeDayAddress } from "../day-address";

/** The filters as the address holds them. A change writes the address without asking the server for the page. */
export function useDayAddress() {
  const params = useSearchParams();
  const address = useMemo(() => readDayAddress(new URLSearchParams(params)), [params]);
  const change = useCallback(
    (part: Partial<DayAddress>) => {
      const next = writeDayAddress({ ...address, ...part });
      // Another day or site is a step that "back" undoes; opening a sheet is not.
      if ("at" in part && Object.keys(part).length === 1) window.history.replaceState(null, "", next);
      else window.history.pushState(null, "", next);
    },
    [address],
  );
  return { address, change };
}
