import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { FreedTimeRow, OfferRoundView, WaitingRow } from "@withy/contracts/diary";
import type { Page } from "@withy/contracts/page";
import { timeOf } from "@withy/core/wall-clock";
import { useChanges } from "@withy/ui/recent-changes";
import {
  fetchFreedTimes,
  fetchRounds,
  fetchVisitsAhead,
  fetchWaiting,
  type WaitingFilters,
  waitingKeys,
} from "../waiting-client";

export function useWaiting(filters: WaitingFilters, first: Page<WaitingRow>) {
  return useQuery({
    queryKey: waitingKeys.list(filters),
    queryFn: ({ signal }) => fetchWaiting(filters, signal),
    initialData: first,
    // Whoever accepts leaves the list, and whoever is asked is marked so.
    refetchInterval: ({ state }) => (state.data?.rows.some((row) => row.openRoundId) ? 3_000 : 30_000),
  });
}

/** What is on offer, read again every two seconds while anything is. */
export function useRounds(first: readonly OfferRoundView[]) {
  return useQuery({
    queryKey: waitingKeys.rounds,
    queryFn: ({ signal }) => fetchRounds(signal),
    initialData: first,
    refetchInterval: ({ state }) => (state.data?.some((round) => round.state === "open") ? 2_000 : 30_000),
  });
}

export function useFreedTimes(first: readonly FreedTimeRow[]) {
  return useQuery({
    queryKey: waitingKeys.freed,
    queryFn: ({ signal }) => fetchFreedTimes(signal),
    initialData: first,
    refetchInterval: 30_000,
  });
}

export function useVisitsAhead(patientId: string | null) {
  return useQuery({
    queryKey: waitingKeys.visits(patientId ?? ""),
    queryFn: ({ signal }) => fetchVisitsAhead(patientId ?? "", signal),
    enabled: patientId !== null,
  });
}

/** A write on the list or on an offer: everything of the list is read again, and the recent changes get a line. */
export function useWaitingMutation<Input, Answer>(
  run: (input: Input) => Promise<Answer>,
  describe: (answer: Answer, input: Input) => string,
  zone: string,
) {
  const client = useQueryClient();
  const { announce } = useChanges();
  return useMutation({
    mutationFn: run,
    onSuccess: (answer, input) => {
      announce({ at: timeOf(new Date(), zone), said: describe(answer, input) });
      void client.invalidateQueries({ queryKey: waitingKeys.all });
    },
  });
}
