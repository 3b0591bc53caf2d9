import { useMutation } from "@tanstack/react-query";
import type { AddGpPracticeInput } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { addGpPractice } from "../api-client";

export function useAddSurgery() {
  return useMutation({ mutationFn: (input: AddGpPracticeInput) => addGpPractice(input, newId()) });
}
