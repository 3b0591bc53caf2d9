import { revokeApiKey } from "@withy/services/practices";
import { route } from "@/server/run-route";

export const DELETE = route(revokeApiKey);
