/** As many ids as no replay is longer than. */
const mostKept = 4000;

/** Remembers which changes were received, so that one told again after a reconnection counts once. */
export interface LiveInbox {
  /** Those of the changes that were never taken before, in their order. */
  take<T extends { readonly id: string }>(changes: readonly T[]): T[];
}

/**
 * A stream is told everything at least once: after a reconnection the server goes back by an overlap, because a change
 * with an earlier id may have been committed later. Whoever listens drops what it knows.
 */
export function openLiveInbox(): LiveInbox {
  const known = new Set<string>();
  return {
    take(changes) {
      const fresh = changes.filter(({ id }) => {
        if (known.has(id)) return false;
        known.add(id);
        return true;
      });
      for (const id of known) {
        if (known.size <= mostKept) break;
        known.delete(id);
      }
      return fresh;
    },
  };
}
