import { getExercise } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const GET = route(getExercise);
