import { listPatientVisitsAheadInput, type VisitAhead } from "@withy/contracts/diary";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { sql } from "drizzle-orm";
import { verb } from "../verb";
import { rowsOf, sqlTime, utc } from "./raw-rows";

/** More than a form can offer to choose from. */
const most = 20;

interface Row {
  id: string;
  starts_at: string;
  zone: string;
  service_id: string;
  service_name: string;
  therapist_name: string;
}

/** A patient's visits to come, soonest first, for the choice of the one that another time would replace. */
export const listPatientVisitsAhead = verb(
  "diary.read",
  listPatientVisitsAheadInput,
  async (ctx, { patientId }): Promise<VisitAhead[]> => {
    const rows = await rowsOf<Row>(
      ctx.db,
      sql`select a.id, a.starts_at, s.zone, v.id as service_id, v.name as service_name,
          concat(t.given_name, ' ', t.family_name) as therapist_name
        from appointments a
          join sites s on s.practice_id = a.practice_id and s.id = a.site_id
          join services v on v.practice_id = a.practice_id and v.id = a.service_id
          join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
        where a.practice_id = ${ctx.practiceId} and a.patient_id = ${patientId}
          and a.starts_at > ${sqlTime(ctx.clock.now())} and a.state in ('booked', 'confirmed')
        order by a.starts_at limit ${most}`,
    );
    return rows.map((row) => {
      const at = new Date(utc(row.starts_at));
      return {
        id: row.id,
        day: dayOf(at, row.zone),
        startTime: timeOf(at, row.zone),
        serviceId: row.service_id,
        serviceName: row.service_name,
        therapistName: row.therapist_name,
      };
    });
  },
);
