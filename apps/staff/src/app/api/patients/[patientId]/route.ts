import { editPatient, getPatient } from "@withy/services/patients";
import { route } from "@/server/run-route";

export const GET = route(getPatient);
export const PUT = route(editPatient);
