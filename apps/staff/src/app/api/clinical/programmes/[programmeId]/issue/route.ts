import { issueProgramme } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const POST = route(issueProgramme);
