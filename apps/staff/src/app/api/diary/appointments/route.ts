import { bookAppointment } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const POST = route(bookAppointment, { status: 201 });
