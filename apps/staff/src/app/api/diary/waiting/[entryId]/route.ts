import { editWaitingEntry } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const PUT = route(editWaitingEntry);
