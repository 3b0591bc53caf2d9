import { listCoverPlaces } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listCoverPlaces);
