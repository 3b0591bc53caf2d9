import { listEpisodes, openEpisode } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const GET = route(listEpisodes);
export const POST = route(openEpisode, { status: 201 });
