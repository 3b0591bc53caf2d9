import { systemClock } from "@withy/core/clock";
import { newId } from "@withy/core/ids";
import { type Connection, connect } from "@withy/db/client";
import { appointmentChanges, sessions } from "@withy/db/schema";
import { openLiveInbox } from "@withy/diary/live-inbox";
import { openLiveHub } from "@withy/services/diary";
import type { TestPractice } from "../../../support/practice";
import type { TestPerson } from "../../../support/practice-staff";

/** A session that lives now, as a sign-in opens it. */
export async function openSession(practice: TestPractice, person: TestPerson): Promise<string> {
  const id = newId();
  const now = new Date();
  const member = practice.staff[person];
  await practice.db.insert(sessions).values({
    id,
    practiceId: practice.practiceId,
    staffMemberId: member.id,
    createdAt: now,
    lastSeenAt: now,
    expiresAt: new Date(now.getTime() + 3_600_000),
    deskSiteId: member.homeSiteId,
  });
  return id;
}

/** A pool and a hub of its own, as every app process has. */
export function openProcess() {
  const connection = connect(process.env.DATABASE_URL ?? "", { connectionLimit: 4 });
  const faults: unknown[] = [];
  const hub = openLiveHub({ db: connection.db, clock: systemClock }, (error) => faults.push(error), 60);
  return { connection, hub, faults };
}

export type LiveProcess = ReturnType<typeof openProcess>;

/** A browser: one stream at a time, the ids as they came and as its inbox let them through. */
export function openBrowser(practice: TestPractice, sessionId: string, siteIds: readonly string[]) {
  const inbox = openLiveInbox();
  const taken: string[] = [];
  const presence: string[] = [];
  const heldAt: string[] = [];
  let ofThisStream: string[] = [];
  let cursor: number | null = null;
  let hasEnded = false;
  let stop = () => {};
  return {
    taken,
    presence,
    heldAt,
    ofThisStream: () => ofThisStream,
    hasEnded: () => hasEnded,
    cursor: () => cursor,
    join({ hub }: LiveProcess) {
      ofThisStream = [];
      stop = hub.follow(practice.practiceId, {
        sessionId,
        siteIds,
        since: cursor,
        tell(news, at) {
          cursor = at;
          ofThisStream.push(...news.changes.map(({ id }) => id));
          taken.push(...inbox.take(news.changes).map(({ id }) => id));
          presence.push(...news.presence);
          heldAt.push(...news.holds);
        },
        end() {
          hasEnded = true;
        },
      });
    },
    leave: () => stop(),
  };
}

/** Writes one change in a transaction that commits only after a while, so that commits come out of the order of ids. */
export function writeLater(
  connection: Connection,
  practice: TestPractice,
  appointmentId: string,
  siteId: string,
  waitMs: number,
): Promise<string> {
  return connection.db.transaction(async (tx) => {
    const id = newId();
    await tx.insert(appointmentChanges).values({
      practiceId: practice.practiceId,
      id,
      appointmentId,
      siteId,
      kind: "marked",
      before: { state: "booked" },
      after: { startsAt: "2026-12-02T10:00:00.000Z", therapistId: practice.staff.therapist.id },
      changedBy: practice.staff.receptionist.id,
      changedAt: new Date(),
    });
    await new Promise((resolve) => setTimeout(resolve, waitMs));
    return id;
  });
}
