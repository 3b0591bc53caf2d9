import { listPutAside, putAside } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listPutAside);
export const POST = route(putAside, { status: 201 });
