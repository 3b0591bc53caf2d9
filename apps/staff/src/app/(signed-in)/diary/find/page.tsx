import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { getBookingChoices } from "@withy/services/diary";
import { getPatient } from "@withy/services/patients";
import type { Metadata } from "next";
import { FindScreen } from "@/features/diary/components/find-screen";
import { readWishes } from "@/features/diary/find-wishes";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/diary.css";
import "@/features/diary/found-day.css";
import "@/features/diary/find.css";

export const metadata: Metadata = { title: "Find a time" };

export default async function FindPage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.book");
  const query = queryOf(await searchParams);
  const patientId = query.get("patient");
  const [choices, patient] = await Promise.all([
    getBookingChoices(ctx, {}),
    patientId ? orNotFound(getPatient(ctx, { patientId })) : null,
  ]);
  return (
    <FindScreen
      choices={choices}
      start={readWishes(query)}
      startPatient={
        patient && { id: patient.id, label: patient.name, detail: `born ${plainDateWords(patient.bornOn)}` }
      }
      today={choices.sites[0]?.today ?? dayOf(ctx.clock.now(), ctx.zone)}
    />
  );
}
