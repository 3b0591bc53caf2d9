import { listPayers } from "@withy/services/patients";
import { route } from "@/server/run-route";

export const GET = route(listPayers);
