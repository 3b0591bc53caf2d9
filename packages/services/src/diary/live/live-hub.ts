import type { SystemContext } from "../../context";
import { type Follower, openPracticeFeed, type PracticeFeed } from "./practice-feed";

export type { Follower } from "./practice-feed";

/** All live streams of one process. Each process has its own: they share nothing but the database. */
export interface LiveHub {
  /** Tells a stream what happens in a practice until the returned function is called. */
  follow(practiceId: string, follower: Follower): () => void;
}

export function openLiveHub(
  system: Pick<SystemContext, "db" | "clock">,
  onFault: (error: unknown) => void,
  everyMs?: number,
): LiveHub {
  const feeds = new Map<string, PracticeFeed>();
  return {
    follow(practiceId, follower) {
      const feed = feeds.get(practiceId) ?? openPracticeFeed(system, practiceId, onFault, everyMs);
      feeds.set(practiceId, feed);
      feed.add(follower);
      return () => {
        feed.remove(follower);
        if (feed.isEmpty() && feeds.get(practiceId) === feed) feeds.delete(practiceId);
      };
    },
  };
}
