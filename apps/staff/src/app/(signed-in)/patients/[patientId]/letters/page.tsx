import "@/features/letters/letter.css";
import "@/features/letters/letter-list.css";
import { can } from "@withy/core/access/can";
import { listEpisodes } from "@withy/services/clinical";
import { listLetters } from "@withy/services/letters";
import type { Metadata } from "next";
import { PatientLetters } from "@/features/letters/components/patient-letters";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Letters" };

export default async function PatientLettersPage({
  params,
  searchParams,
}: PageProps<"/patients/[patientId]/letters">) {
  const ctx = await requireContext("letters.read");
  const { patientId } = await params;
  const { episode } = await searchParams;
  const [letters, episodes] = await Promise.all([
    orNotFound(listLetters(ctx, { patientId, pageSize: 100 })),
    can(ctx.roles, "clinical.read") ? orNotFound(listEpisodes(ctx, { patientId })) : [],
  ]);
  return (
    <PatientLetters
      first={letters}
      patientId={patientId}
      episodes={episodes.map(({ id, problem, place, state }) => ({ id, problem, place, state }))}
      wishedEpisode={typeof episode === "string" ? episode : null}
      mayWrite={can(ctx.roles, "letters.write")}
      zone={ctx.zone}
    />
  );
}
