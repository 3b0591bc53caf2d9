import { previewCourse } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(previewCourse);
