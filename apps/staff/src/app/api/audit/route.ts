import { listAudit } from "@withy/services/audit";
import { route } from "@/server/run-route";

export const GET = route(listAudit);
