import { readFhir } from "@withy/services/diary/fhir/index";
import { answerFhir } from "@/server/fhir-route";

/** One Appointment, Slot or Schedule by its id, for programs with a key. */
export async function GET(request: Request, { params }: { params: Promise<{ type: string; id: string }> }) {
  const { type, id } = await params;
  return answerFhir(request, (ctx) => readFhir(ctx, type, id));
}
