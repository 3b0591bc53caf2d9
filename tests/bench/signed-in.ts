import type { Connection } from "mysql2/promise";
import { encode } from "next-auth/jwt";
import { volumeId } from "./volume-plan";

/** Opens a session for the practice's owner and gives the cookie that a browser would carry. */
export async function openSession(connection: Connection, secret: string): Promise<string> {
  const sid = volumeId("session", Date.now() % 1_000_000);
  await connection.query(
    `INSERT INTO sessions (id, practice_id, staff_member_id, created_at, last_seen_at, expires_at, desk_site_id)
     VALUES (?, ?, ?, UTC_TIMESTAMP(3), UTC_TIMESTAMP(3), DATE_ADD(UTC_TIMESTAMP(3), INTERVAL 8 HOUR), ?)`,
    [sid, volumeId("practice", 1), volumeId("member", 0), volumeId("site", 0)],
  );
  const token = await encode({ token: { sid, name: "Bench" }, secret, maxAge: 8 * 3600 });
  return `next-auth.session-token=${token}`;
}
