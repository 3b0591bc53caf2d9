import { removeSavedView } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const DELETE = route(removeSavedView);
