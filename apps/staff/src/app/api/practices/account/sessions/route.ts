import { listMySessions } from "@withy/services/practices";
import { route } from "@/server/run-route";

export const GET = route(listMySessions);
