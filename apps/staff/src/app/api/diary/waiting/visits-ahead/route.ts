import { listPatientVisitsAhead } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listPatientVisitsAhead);
