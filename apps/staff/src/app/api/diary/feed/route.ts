import { makeCalendarFeed, revokeCalendarFeed } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const POST = route(makeCalendarFeed, { status: 201 });
export const DELETE = route(revokeCalendarFeed);
