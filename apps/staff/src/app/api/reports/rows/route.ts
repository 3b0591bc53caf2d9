import { listFigureRows } from "@withy/services/reports";
import { route } from "@/server/run-route";

export const GET = route(listFigureRows);
