import { draftInvoicesFromVisits } from "@withy/services/billing";
import { route } from "@/server/run-route";

export const POST = route(draftInvoicesFromVisits);
