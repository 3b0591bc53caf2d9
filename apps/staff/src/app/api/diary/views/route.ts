import { listSavedViews, saveView } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listSavedViews);
export const POST = route(saveView, { status: 201 });
