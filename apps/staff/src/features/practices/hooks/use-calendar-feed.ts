import { useMutation } from "@tanstack/react-query";
import { makeCalendarFeed, revokeCalendarFeed } from "../api-client";

export function useMakeCalendarFeed() {
  return useMutation({ mutationFn: makeCalendarFeed });
}

export function useRevokeCalendarFeed() {
  return useMutation({ mutationFn: revokeCalendarFeed });
}
