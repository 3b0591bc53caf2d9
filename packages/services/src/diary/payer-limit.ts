import type { PayerLimit } from "@withy/diary/check-authorisation";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { rowsOf } from "./raw-rows";

/**
 * What the patient's payer has authorised and how much of it is spoken for; null where the patient pays or no limit
 * was written down.
 * @param lock hold the authorisation, so that two desks cannot both use the last of it
 */
export async function readPayerLimit(
  ctx: Context,
  patientId: string,
  lock = false,
): Promise<PayerLimit | null> {
  const [held] = await rowsOf<{ name: string; authorised: number; since: string }>(
    ctx.db,
    sql`select y.name, h.sessions_authorised as authorised, h.created_at as since
      from patient_payers h join payers y on y.practice_id = h.practice_id and y.id = h.payer_id
      where h.practice_id = ${ctx.practiceId} and h.patient_id = ${patientId} and h.is_current = 1
        and h.sessions_authorised is not null
      order by h.created_at desc limit 1 ${lock ? sql`for update` : sql``}`,
  );
  if (!held) return null;
  const [count] = await rowsOf<{ used: number }>(
    ctx.db,
    sql`select count(*) as used from appointments a
      where a.practice_id = ${ctx.practiceId} and a.patient_id = ${patientId} and a.starts_at >= ${held.since}
        and a.state not in ('cancelled', 'noshow')`,
  );
  return { payerName: held.name, authorised: Number(held.authorised), used: Number(count?.used ?? 0) };
}
