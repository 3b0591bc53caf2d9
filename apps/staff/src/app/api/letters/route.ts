import { draftDischargeLetter, listLetters } from "@withy/services/letters";
import { route } from "@/server/run-route";

export const GET = route(listLetters);
export const POST = route(draftDischargeLetter, { status: 201 });
