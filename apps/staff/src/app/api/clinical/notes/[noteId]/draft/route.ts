import { saveNoteDraft } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const PUT = route(saveNoteDraft);
