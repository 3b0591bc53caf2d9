import { undoCoverPlan } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const POST = route(undoCoverPlan);
