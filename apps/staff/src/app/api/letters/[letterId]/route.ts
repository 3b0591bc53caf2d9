import { getLetter, saveLetter } from "@withy/services/letters";
import { route } from "@/server/run-route";

export const GET = route(getLetter);
export const PUT = route(saveLetter);
