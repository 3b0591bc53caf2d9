import { listHolds } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listHolds);
