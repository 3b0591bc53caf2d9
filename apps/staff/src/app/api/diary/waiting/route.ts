import { addWaitingEntry, listWaiting } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listWaiting);
export const POST = route(addWaitingEntry, { status: 201 });
