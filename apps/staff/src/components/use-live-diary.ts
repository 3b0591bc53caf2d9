"use client";
import { type QueryClient, useQueryClient } from "@tanstack/react-query";
import type { LiveChange } from "@withy/contracts/diary";
import { openLiveInbox } from "@withy/diary/live-inbox";
import { useEffect, useState } from "react";

/** A stream that was refused is tried again after this long; until then screens ask by themselves. */
const againMs = 15_000;

/** What of the diary is read again when a stream tells of it. Every screen of the diary keeps its rows under these. */
export const liveKeys = {
  diary: ["diary"],
  holds: ["diary-holds"],
  presence: (appointmentId: string) => ["diary-presence", appointmentId],
} as const;

/**
 * Reads again whatever other desks change at these sites.
 * @returns false while there is no stream, so that the screen asks by itself
 */
export function useLiveDiary(siteIds: readonly string[]): boolean {
  const client = useQueryClient();
  const [isLive, setIsLive] = useState(false);
  const sites = siteIds.join(" ");
  useEffect(() => {
    if (sites === "" || typeof EventSource === "undefined") return;
    return followSites(sites.split(" "), client, setIsLive);
  }, [sites, client]);
  return isLive;
}

/** Keeps one stream open while the page is in view: a browser has few connections to share among its tabs. */
function followSites(
  siteIds: readonly string[],
  client: QueryClient,
  onLive: (isLive: boolean) => void,
): () => void {
  const inbox = openLiveInbox();
  let source: EventSource | null = null;
  let last = "";
  let again: ReturnType<typeof setTimeout> | undefined;
  const close = () => {
    clearTimeout(again);
    source?.close();
    source = null;
    onLive(false);
  };
  const open = () => {
    close();
    const query = new URLSearchParams(siteIds.map((id) => ["siteIds", id]));
    if (last !== "") query.set("after", last);
    const stream = new EventSource(`/api/diary/live?${query}`);
    source = stream;
    const on = (name: string, act: (data: string) => void) =>
      stream.addEventListener(name, (event: MessageEvent<string>) => {
        if (event.lastEventId !== "") last = event.lastEventId;
        act(event.data);
      });
    stream.onopen = () => onLive(true);
    stream.onerror = () => {
      onLive(false);
      if (stream.readyState !== EventSource.CLOSED) return;
      close();
      again = setTimeout(open, againMs);
    };
    on("changes", (data) => {
      const fresh = inbox.take(JSON.parse(data) as LiveChange[]);
      if (fresh.length > 0) void client.invalidateQueries({ queryKey: liveKeys.diary });
    });
    on("holds", () => void client.invalidateQueries({ queryKey: liveKeys.holds }));
    on("presence", (data) => {
      for (const id of JSON.parse(data) as string[])
        void client.invalidateQueries({ queryKey: liveKeys.presence(id) });
    });
    on("reload", () => void client.invalidateQueries());
    // The next request of the page is refused and says so.
    on("ended", close);
  };
  const onVisible = () => (document.visibilityState === "hidden" ? close() : source === null && open());
  document.addEventListener("visibilitychange", onVisible);
  onVisible();
  return () => {
    document.removeEventListener("visibilitychange", onVisible);
    close();
  };
}
