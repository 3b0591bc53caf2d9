import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { RegisterPatientInput } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { useState } from "react";
import { editPatient, registerPatient } from "../api-client";
import { patientKeys } from "../query-keys";

/** Registers the patient; the same form sent twice registers once. */
export function useRegisterPatient() {
  const client = useQueryClient();
  const [key] = useState(newId);
  return useMutation({
    mutationFn: (input: RegisterPatientInput) => registerPatient(input, key),
    onSuccess: () => client.invalidateQueries({ queryKey: patientKeys.all }),
  });
}

export function useEditPatient(patientId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ version, ...input }: RegisterPatientInput & { version: number }) =>
      editPatient({ patientId, version, ...input }),
    onSuccess: () => client.invalidateQueries({ queryKey: patientKeys.all }),
  });
}
