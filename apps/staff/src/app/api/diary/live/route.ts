import { getDiaryWatch } from "@withy/services/diary";
import { liveResponse } from "@/server/live-stream";
import { route } from "@/server/run-route";

/** A stream of what changes. A browser that comes back by itself says in a header what it last heard. */
export const GET = route(getDiaryWatch, {
  respond: liveResponse,
  fromHeaders: { after: "last-event-id" },
});
