import { addGpPractice, listGpPractices } from "@withy/services/patients";
import { route } from "@/server/run-route";

export const GET = route(listGpPractices);
export const POST = route(addGpPractice, { status: 201 });
