import "server-only";
import type { DiaryWatchView, LiveEvents } from "@withy/contracts/diary";
import { systemClock } from "@withy/core/clock";
import type { Context } from "@withy/services/context";
import { type LiveHub, openLiveHub } from "@withy/services/diary";
import { database } from "./database";
import { log } from "./log";
import { describe } from "./run-route";

const held = globalThis as typeof globalThis & { withyLiveHub?: LiveHub };

/** The one hub of this process; kept on globalThis so that every route and a reload in development share it. */
function liveHub(): LiveHub {
  held.withyLiveHub ??= openLiveHub({ db: database().db, clock: systemClock }, (error) =>
    log.error({ error: describe(error) }, "live changes could not be read"),
  );
  return held.withyLiveHub;
}

/** Tells proxies and browsers that the stream lives, and carries the cursor on where nothing happens. */
const beatMs = 15_000;

/** A reader who is this many events behind is cut off; it comes back and is told the rest. */
const mostWaiting = 500;

const encoder = new TextEncoder();

/** An open stream of server-sent events, until the browser leaves or the session ends. */
export function liveResponse(watch: DiaryWatchView, ctx: Context): Response {
  let stop = () => {};
  const body = new ReadableStream<Uint8Array>(
    {
      start(controller) {
        stop = pipe(controller, watch, ctx);
      },
      cancel() {
        stop();
      },
    },
    { highWaterMark: mostWaiting },
  );
  return new Response(body, {
    headers: {
      "content-type": "text/event-stream; charset=utf-8",
      // Compression would hold events back until a block is full.
      "cache-control": "no-store, no-transform",
      "x-accel-buffering": "no",
    },
  });
}

function pipe(
  controller: ReadableStreamDefaultController<Uint8Array>,
  watch: DiaryWatchView,
  ctx: Context,
): () => void {
  let spokeAt = Date.now();
  let isOver = false;
  let unfollow = () => {};
  const stop = () => {
    isOver = true;
    unfollow();
  };
  const close = () => {
    if (isOver) return;
    stop();
    controller.close();
  };
  const send = (text: string) => {
    if (isOver) return;
    if ((controller.desiredSize ?? 0) <= 0) return close();
    spokeAt = Date.now();
    controller.enqueue(encoder.encode(text));
  };
  send(watch.mustReload ? "retry: 2000\nevent: reload\ndata:{}\n\n" : "retry: 2000\n\n");
  unfollow = liveHub().follow(ctx.practiceId, {
    sessionId: ctx.sessionId,
    siteIds: watch.siteIds,
    since: watch.since,
    tell(news, cursor) {
      const text = eventsText(news, cursor);
      // An id without data reaches no listener, but is what the browser says when it comes back.
      if (text !== "") send(text);
      else if (Date.now() - spokeAt >= beatMs) send(`id: ${cursor}\n\n`);
    },
    end() {
      send("event: ended\ndata:{}\n\n");
      close();
    },
  });
  return stop;
}

function eventsText(news: LiveEvents, cursor: number): string {
  return (["changes", "holds", "presence"] as const)
    .filter((name) => news[name].length > 0)
    .map((name) => `id: ${cursor}\nevent: ${name}\ndata: ${JSON.stringify(news[name])}\n\n`)
    .join("");
}
