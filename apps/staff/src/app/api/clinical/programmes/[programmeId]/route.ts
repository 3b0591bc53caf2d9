import { getProgramme, saveProgramme } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const GET = route(getProgramme);
export const PUT = route(saveProgramme);
