import { deactivateStaff } from "@withy/services/practices";
import { route } from "@/server/run-route";

export const POST = route(deactivateStaff);
