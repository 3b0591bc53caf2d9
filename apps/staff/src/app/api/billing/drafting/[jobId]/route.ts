import { getDraftingJob } from "@withy/services/billing";
import { route } from "@/server/run-route";

export const GET = route(getDraftingJob);
