import { changeRoles } from "@withy/services/practices";
import { route } from "@/server/run-route";

export const PUT = route(changeRoles);
