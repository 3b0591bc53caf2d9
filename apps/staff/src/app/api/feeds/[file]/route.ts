import { isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { readCalendarFeed } from "@withy/services/diary";
import { addressOf } from "@/server/auth";
import { problemResponse } from "@/server/run-route";
import { systemContext } from "@/server/session";

/** Kept by the calendar that asked and by nobody between, and asked for anew each time. */
const kept = { "cache-control": "private, no-cache", "referrer-policy": "no-referrer" };

/** "<token>.ics"; anything else is an address that does not exist. */
const tokenOf = (file: string): string => (file.endsWith(".ics") ? file.slice(0, -4) : "");

/** A therapist's calendar by its secret address, for calendar programs: no session, and a 304 where nothing changed. */
export async function GET(request: Request, { params }: { params: Promise<{ file: string }> }) {
  const requestId = newId();
  const { file } = await params;
  try {
    const { etag, content } = await readCalendarFeed(systemContext(requestId), {
      token: tokenOf(file),
      caller: addressOf(request.headers),
      known: request.headers.get("if-none-match"),
    });
    const headers = { ...kept, etag };
    if (content === null) return new Response(null, { status: 304, headers });
    return new Response(content, {
      headers: {
        ...headers,
        "content-type": "text/calendar; charset=utf-8",
        "content-disposition": 'inline; filename="diary.ics"',
      },
    });
  } catch (error) {
    // The address is a secret, so the log does not get it.
    const answer = problemResponse(error, requestId, "GET", "/api/feeds");
    answer.headers.set("cache-control", "no-store");
    if (!isAppError(error) || error.kind !== "too-many-tries") return answer;
    // What a program understands as "later"; the body says it to a person.
    answer.headers.set("retry-after", "900");
    return new Response(answer.body, { status: 429, headers: answer.headers });
  }
}
