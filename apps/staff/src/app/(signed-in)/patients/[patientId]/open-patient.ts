import "server-only";
import { getPatient } from "@withy/services/patients";
import { cache } from "react";
import { orNotFound, requireContext } from "@/server/context";

/** The record as opened by this request: read, and written down as read, once for the frame and the page in it. */
export const openPatient = cache(async (patientId: string) => {
  const ctx = await requireContext("patients.read");
  return orNotFound(getPatient(ctx, { patientId }));
});
