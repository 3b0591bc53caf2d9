import { checkHealth } from "@withy/services/messaging";
import { systemContext } from "@/server/session";

/** Says ok or not ok for app, database and worker; 200 only when all three are well. */
export async function GET() {
  const health = await checkHealth(systemContext());
  return Response.json(health, {
    status: health.isWell ? 200 : 503,
    headers: { "cache-control": "no-store" },
  });
}
