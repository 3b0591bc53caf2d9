import { searchFhir } from "@withy/services/diary/fhir/index";
import { answerFhir, fhirBase } from "@/server/fhir-route";

/** Searches Appointment, Slot or Schedule, for programs with a key. */
export async function GET(request: Request, { params }: { params: Promise<{ type: string }> }) {
  const { type } = await params;
  return answerFhir(request, (ctx) => searchFhir(ctx, fhirBase(), type, new URL(request.url).searchParams));
}
