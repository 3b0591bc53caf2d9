import { getDiaryWatch } from "@withy/services/diary";
import { NextRequest } from "next/server";
import { liveResponse } from "@/server/live-stream";
import { type RouteHandler, route } from "@/server/run-route";

const open = route(getDiaryWatch, { respond: (watch, ctx) => liveResponse(watch, ctx) });

/** A stream of what changes. A browser that comes back by itself says in a header what it last heard. */
export const GET: RouteHandler = (request, params) => {
  const last = request.headers.get("last-event-id");
  if (last === null) return open(request, params);
  const url = new URL(request.url);
  url.searchParams.set("after", last);
  return open(new NextRequest(url, { headers: request.headers, signal: request.signal }), params);
};
