import { listPatients, registerPatient } from "@withy/services/patients";
import { route } from "@/server/run-route";

export const GET = route(listPatients);
export const POST = route(registerPatient, { status: 201 });
