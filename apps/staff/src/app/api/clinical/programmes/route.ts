import { createProgramme, listProgrammes } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const GET = route(listProgrammes);
export const POST = route(createProgramme, { status: 201 });
