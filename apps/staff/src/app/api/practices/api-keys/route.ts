import { makeApiKey } from "@withy/services/practices";
import { route } from "@/server/run-route";

export const POST = route(makeApiKey, { status: 201 });
