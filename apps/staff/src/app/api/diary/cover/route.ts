import { listCoverPlans, planCover } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listCoverPlans);
export const POST = route(planCover, { status: 202 });
