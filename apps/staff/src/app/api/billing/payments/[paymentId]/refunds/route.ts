import { refundPayment } from "@withy/services/billing";
import { route } from "@/server/run-route";

export const POST = route(refundPayment, { status: 201 });
