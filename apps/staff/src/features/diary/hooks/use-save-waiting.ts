import type { WaitingRow } from "@withy/contracts/diary";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { addWaiting, type EditWaiting, editWaiting } from "../waiting-client";
import type { waitingInput } from "../waiting-form";
import { useWaitingMutation } from "./use-waiting";

type Input = ReturnType<typeof waitingInput> & { patientId: string };

/** The field that a wish of the contract stands in. */
const fieldId = (field: string): string => `waiting-${field.replace(/^wishes\./, "").replace(/\.\d+$/, "")}`;

/** Adds or edits by one form; pressing twice adds once. */
export function useSaveWaiting(row: WaitingRow | null, zone: string) {
  const [key] = useState(() => crypto.randomUUID());
  const [last, setLast] = useState("");
  const send = ({ patientId, ...input }: Input) => {
    if (row) return editWaiting({ ...input, entryId: row.id, version: row.version } satisfies EditWaiting);
    const body = JSON.stringify({ patientId, ...input });
    // A corrected form is another request than the one that was refused.
    const isRepeat = last === "" || last === body;
    setLast(body);
    return addWaiting({ patientId, ...input }, isRepeat ? key : crypto.randomUUID());
  };
  const said = row ? `Wishes of ${row.patient.name} saved` : "Added to the waiting list";
  const mutation = useWaitingMutation(send, () => said, zone);
  return {
    isPending: mutation.isPending,
    attempt: `${mutation.failureCount} ${mutation.submittedAt}`,
    problems: mutation.error
      ? problemItems(mutation.error, fieldId).map((one) => ({ id: one.id ?? "", message: one.message }))
      : [],
    run: (patientId: string, input: ReturnType<typeof waitingInput>, onDone: () => void) =>
      mutation.mutate({ patientId, ...input }, { onSuccess: onDone }),
  };
}
