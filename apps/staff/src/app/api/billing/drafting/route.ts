import { startDrafting } from "@withy/services/billing";
import { route } from "@/server/run-route";

export const POST = route(startDrafting, { status: 202 });
