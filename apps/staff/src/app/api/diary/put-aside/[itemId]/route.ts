import { removePutAside } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const DELETE = route(removePutAside);
