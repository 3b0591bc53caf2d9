import { listMessages } from "@withy/services/messaging";
import { route } from "@/server/run-route";

export const GET = route(listMessages);
