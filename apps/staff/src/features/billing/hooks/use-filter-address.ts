import { useSearchParams } from "next/navigation";
import { useMemo } from "react";
import { type FilterAddress, readFilterAddress, writeFilterAddress } from "../filter-address";

/** The filter as the address holds it. A change is a step that "back" undoes, and starts at the first page. */
export function useFilterAddress() {
  const params = useSearchParams();
  const filter = useMemo(() => readFilterAddress(new URLSearchParams(params)), [params]);
  const change = (part: Partial<FilterAddress>) => {
    window.history.pushState(null, "", writeFilterAddress({ ...filter, page: 1, ...part }));
  };
  return { filter, change };
}
