import { initialsOf } from "@withy/core/names";
import type { FeedEvent } from "@withy/documents/calendar/therapist-calendar";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { rowsOf, sqlTime, utc } from "./raw-rows";

interface Asked {
  readonly therapistId: string;
  readonly from: Date;
  readonly to: Date;
  readonly hasNames: boolean;
}

interface EventRow {
  readonly id: string;
  readonly version: number;
  readonly starts_at: string;
  readonly ends_at: string;
  readonly updated_at: string;
  readonly state: string;
  readonly place: string;
}

type Own = Pick<Context, "db" | "practiceId">;

const eventOf = (row: EventRow, kind: FeedEvent["kind"], summary: string): FeedEvent => ({
  id: row.id,
  kind,
  version: row.version,
  startsAt: new Date(utc(row.starts_at)),
  endsAt: new Date(utc(row.ends_at)),
  changedAt: new Date(utc(row.updated_at)),
  isCancelled: row.state === "cancelled",
  summary,
  place: row.place,
});

async function readVisits({ db, practiceId }: Own, asked: Asked): Promise<FeedEvent[]> {
  const rows = await rowsOf<EventRow & { given_name: string; family_name: string }>(
    db,
    sql`
    select a.id, a.version, a.starts_at, a.ends_at, a.updated_at, a.state,
      concat(s.name, ', ', r.name) as place, p.given_name, p.family_name
    from appointments a
      join sites s on s.practice_id = a.practice_id and s.id = a.site_id
      join rooms r on r.practice_id = a.practice_id and r.id = a.room_id
      join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
    where a.practice_id = ${practiceId} and a.therapist_id = ${asked.therapistId}
      and a.starts_at >= ${sqlTime(asked.from)} and a.starts_at < ${sqlTime(asked.to)}
    order by a.starts_at, a.id`,
  );
  return rows.map((row) => {
    const { given_name: given, family_name: family } = row;
    return eventOf(row, "appointment", asked.hasNames ? `${given} ${family}` : initialsOf(given, family));
  });
}

/** A class's own title may say what its people have, so it is told only as a class. */
async function readClasses({ db, practiceId }: Own, asked: Asked): Promise<FeedEvent[]> {
  const rows = await rowsOf<EventRow>(
    db,
    sql`
    select c.id, c.version, c.starts_at, c.ends_at, c.updated_at, c.state, concat(s.name, ', ', r.name) as place
    from class_sessions c
      join sites s on s.practice_id = c.practice_id and s.id = c.site_id
      join rooms r on r.practice_id = c.practice_id and r.id = c.room_id
    where c.practice_id = ${practiceId} and c.therapist_id = ${asked.therapistId}
      and c.starts_at >= ${sqlTime(asked.from)} and c.starts_at < ${sqlTime(asked.to)}
    order by c.starts_at, c.id`,
  );
  return rows.map((row) => eventOf(row, "class", "Class"));
}

/** What a therapist's calendar holds between two instants: visits by initials or name, classes, nothing clinical. */
export async function readFeedEvents(own: Own, asked: Asked): Promise<FeedEvent[]> {
  const [visits, classes] = await Promise.all([readVisits(own, asked), readClasses(own, asked)]);
  return [...visits, ...classes];
}
