import { listMeasures, recordMeasure } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const GET = route(listMeasures);
export const POST = route(recordMeasure, { status: 201 });
