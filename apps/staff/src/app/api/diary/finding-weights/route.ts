import { changeFindingWeights, getFindingWeights } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(getFindingWeights);
export const PUT = route(changeFindingWeights);
