import { useQuery } from "@tanstack/react-query";
import { useEffect } from "react";
import { deskKeys, endPresence, fetchPresence, showPresence } from "../desk-client";

/** Said again well before it lapses. */
const againMs = 25_000;

/** Shows that one has the appointment open, and tells who else has. */
export function usePresence(appointmentId: string, isEditing: boolean) {
  useEffect(() => {
    const say = () => {
      if (document.visibilityState === "visible") showPresence(appointmentId, isEditing).catch(() => {});
    };
    say();
    const timer = setInterval(say, againMs);
    return () => clearInterval(timer);
  }, [appointmentId, isEditing]);
  useEffect(
    () => () => {
      endPresence(appointmentId).catch(() => {});
    },
    [appointmentId],
  );
  const query = useQuery({
    queryKey: deskKeys.presence(appointmentId),
    queryFn: ({ signal }) => fetchPresence(appointmentId, signal),
    refetchInterval: againMs,
  });
  return query.data ?? [];
}
