import { endPresence, listPresence, showPresence } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listPresence);
export const PUT = route(showPresence);
export const DELETE = route(endPresence);
