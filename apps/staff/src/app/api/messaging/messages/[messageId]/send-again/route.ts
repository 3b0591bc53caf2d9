import { sendMessageAgain } from "@withy/services/messaging";
import { route } from "@/server/run-route";

export const POST = route(sendMessageAgain);
