import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { getBookingChoices, listPutAside } from "@withy/services/diary";
import { getPatient } from "@withy/services/patients";
import type { Metadata } from "next";
import { FindScreen } from "@/features/diary/components/find-screen";
import { readWishes } from "@/features/diary/find-wishes";
import { findingAside } from "@/features/diary/put-aside-typed";
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
  const asideId = query.get("aside");
  const [choices, tray, patient] = await Promise.all([
    getBookingChoices(ctx, {}),
    asideId ? listPutAside(ctx, {}) : [],
    patientId ? orNotFound(getPatient(ctx, { patientId })) : null,
  ]);
  // One that was finished meanwhile, or is another person's, is simply not taken up.
  const item = tray.find(({ id, kind }) => id === asideId && kind === "finding");
  const aside = item && findingAside(item);
  return (
    <FindScreen
      key={item?.id ?? ""}
      asideId={item?.id ?? null}
      choices={choices}
      start={aside?.wishes ?? readWishes(query)}
      startPatient={
        aside?.patient ??
        (patient && { id: patient.id, label: patient.name, detail: `born ${plainDateWords(patient.bornOn)}` })
      }
      today={choices.sites[0]?.today ?? dayOf(ctx.clock.now(), ctx.zone)}
    />
  );
}
