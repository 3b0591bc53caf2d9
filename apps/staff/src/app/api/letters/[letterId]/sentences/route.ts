import { settleSentence } from "@withy/services/letters";
import { route } from "@/server/run-route";

export const POST = route(settleSentence);
