import { holdTime, releaseHold } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const PUT = route(holdTime);
export const DELETE = route(releaseHold);
