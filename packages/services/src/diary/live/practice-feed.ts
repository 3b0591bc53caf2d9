import type { LiveEvents } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import type { SystemContext } from "../../context";
import { readLiveSessions } from "../../practices/read-live-sessions";
import { overlapMs, roundMs } from "./live-limits";
import { type Around, type ChangeRow, readAround, readChanges } from "./live-rows";

/** One open stream. */
export interface Follower {
  readonly sessionId: string;
  readonly siteIds: readonly string[];
  /** Everything committed before this (ms) is known; null: from now on. */
  readonly since: number | null;
  /** @param cursor everything committed before it (ms) has now been told */
  tell(news: LiveEvents, cursor: number): void;
  /** The session is over, or its roles no longer reach these sites. */
  end(): void;
}

export interface PracticeFeed {
  add(follower: Follower): void;
  remove(follower: Follower): void;
  isEmpty(): boolean;
}

const nothingAround: Around = { holds: new Map(), presence: new Map() };

/**
 * Everything new in one practice's diary, read once for all its streams. Whoever joins waits for the next round, in
 * which one read serves both: the new stream from where it left off, the others what is new.
 */
export function openPracticeFeed(
  system: Pick<SystemContext, "db" | "clock">,
  practiceId: string,
  onFault: (error: unknown) => void,
  everyMs = roundMs,
): PracticeFeed {
  const joining = new Set<Follower>();
  const following = new Set<Follower>();
  let seen = new Set<string>();
  let readUpTo = Date.now();
  let around = nothingAround;
  let timer: NodeJS.Timeout | null = null;
  let isReading = false;

  async function endTheOver(): Promise<void> {
    const all = [...joining, ...following];
    const live = await readLiveSessions(
      system,
      practiceId,
      all.map((one) => one.sessionId),
    );
    for (const one of all) {
      const roles = live.get(one.sessionId) ?? [];
      if (one.siteIds.every((id) => can(roles, "diary.read", id))) continue;
      remove(one);
      one.end();
    }
  }

  async function round(): Promise<void> {
    await endTheOver();
    if (joining.size + following.size === 0) return;
    const joiners = [...joining];
    const now = Date.now();
    // The overlap is read every time and what was told is left out: see overlapMs.
    const usualFrom = readUpTo - overlapMs;
    const from = Math.min(usualFrom, ...joiners.map((one) => (one.since ?? now) - overlapMs));
    const rows = await readChanges(system.db, practiceId, from);
    const next = await readAround(system.db, practiceId, system.clock.now());
    const fresh = rows.filter((row) => row.madeAt >= usualFrom && !seen.has(row.id));
    const before = around;
    // All is read: from here to the end nothing waits, so that no one joins or leaves half-way.
    seen = new Set(rows.filter((row) => row.madeAt >= now - overlapMs).map((row) => row.id));
    readUpTo = now;
    around = next;
    for (const one of following) one.tell(newsFor(one, fresh, before, next), now);
    for (const one of joiners) {
      if (!joining.delete(one)) continue;
      following.add(one);
      const known = (one.since ?? now) - overlapMs;
      one.tell(
        newsFor(
          one,
          rows.filter((row) => row.madeAt >= known),
          nothingAround,
          next,
        ),
        now,
      );
    }
  }

  async function run(): Promise<void> {
    if (isReading) return;
    isReading = true;
    try {
      await round();
    } catch (error) {
      // Nothing is lost: the next round starts from where the last good one ended.
      onFault(error);
    }
    isReading = false;
    timer = joining.size + following.size === 0 ? null : setTimeout(run, everyMs);
  }

  function remove(follower: Follower): void {
    joining.delete(follower);
    following.delete(follower);
  }

  return {
    add(follower) {
      joining.add(follower);
      if (timer === null && !isReading) timer = setTimeout(run, 0);
    },
    remove,
    isEmpty: () => joining.size + following.size === 0,
  };
}

function newsFor(to: Follower, rows: readonly ChangeRow[], before: Around, after: Around): LiveEvents {
  const isTheirs = (siteId: string) => to.siteIds.includes(siteId);
  const appointments = new Set([...before.presence.keys(), ...after.presence.keys()]);
  return {
    changes: rows.filter((row) => isTheirs(row.siteId)).map(({ madeAt, ...change }) => change),
    holds: to.siteIds.filter((id) => before.holds.get(id) !== after.holds.get(id)),
    presence: [...appointments].filter((id) => {
      const [was, is] = [before.presence.get(id), after.presence.get(id)];
      return was?.text !== is?.text && isTheirs((is ?? was)?.siteId ?? "");
    }),
  };
}
