import type { FieldError } from "@withy/ui/error-summary";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { givesWayToReason, slotTaken, timeErrors, type WantedTime } from "../wanted-time";

/**
 * What booking and moving share: the time being typed, what is wrong with it in the fields' own words, and what a
 * refusal offers. Everything typed stays as it is whatever the server says.
 */
export function useTimeForm(prefix: string, start: WantedTime, failure: unknown, startReason = "") {
  const [wanted, setWanted] = useState(start);
  const [reason, setReason] = useState(startReason);
  const [attempt, setAttempt] = useState(0);
  const [missing, setMissing] = useState<FieldError[]>([]);
  const toId = (field: string) => (field === "startsAt" ? `${prefix}-day` : `${prefix}-${field}`);
  const refused = failure && missing.length === 0 ? problemItems(failure, toId) : [];
  const errors: FieldError[] = missing.length > 0 ? missing : refused;
  return {
    wanted,
    change: (part: Partial<WantedTime>) => setWanted((before) => ({ ...before, ...part })),
    reason,
    setReason,
    errors,
    attempt,
    errorOf: (id: string) => errors.find((error) => error.id === id)?.message,
    taken: missing.length === 0 ? slotTaken(failure) : null,
    asksReason: givesWayToReason(failure) || reason !== "",
    /** Checks what is typed; true where it may be sent. */
    check: (more: FieldError[] = []): boolean => {
      const found = [...more, ...timeErrors(wanted, prefix)];
      setMissing(found);
      setAttempt((n) => n + 1);
      return found.length === 0;
    },
  };
}
