import { discardDraft, editDraft, getInvoice } from "@withy/services/billing";
import { route } from "@/server/run-route";

export const GET = route(getInvoice);
export const PUT = route(editDraft);
export const DELETE = route(discardDraft);
