import { useMutation } from "@tanstack/react-query";
import { changeDiarySettings } from "../api-client";

export function useChangeDiarySettings() {
  return useMutation({ mutationFn: changeDiarySettings });
}
