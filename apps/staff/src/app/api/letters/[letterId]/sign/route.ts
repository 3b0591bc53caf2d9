import { signLetter } from "@withy/services/letters";
import { route } from "@/server/run-route";

export const POST = route(signLetter);
