import { can } from "@withy/core/access/can";
import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { urgencies } from "@withy/diary/waiting-words";
import { getBookingChoices, listFreedTimes, listOfferRounds, listWaiting } from "@withy/services/diary";
import { getPatient } from "@withy/services/patients";
import { listSites } from "@withy/services/practices";
import type { Metadata } from "next";
import { WaitingScreen } from "@/features/diary/components/waiting-screen";
import { queryOf, type SearchParams } from "@/features/diary/search-params";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/diary/waiting.css";

export const metadata: Metadata = { title: "Waiting list" };

export default async function WaitingPage({ searchParams }: { searchParams: SearchParams }) {
  const ctx = await requireContext("diary.read");
  const query = queryOf(await searchParams);
  const urgency = urgencies.find((one) => one === query.get("urgency"));
  const siteId = query.get("site") ?? undefined;
  const page = Math.max(1, Math.floor(Number(query.get("page"))) || 1);
  const mayBook = can(ctx.roles, "diary.book");
  const isAdding = mayBook && query.get("add") === "1";
  const patientId = isAdding ? query.get("patient") : null;
  const [first, rounds, freed, sites, choices, patient] = await Promise.all([
    orNotFound(listWaiting(ctx, { siteId, urgency, page })),
    listOfferRounds(ctx, {}),
    listFreedTimes(ctx, {}),
    listSites(ctx, {}),
    mayBook ? getBookingChoices(ctx, {}) : null,
    patientId ? orNotFound(getPatient(ctx, { patientId })) : null,
  ]);
  const known = patient && {
    id: patient.id,
    label: patient.name,
    detail: `born ${plainDateWords(patient.bornOn)}`,
  };
  return (
    <WaitingScreen
      key={query.toString()}
      filters={{ siteId, urgency, page }}
      first={first}
      rounds={rounds}
      freed={freed}
      sites={sites.map(({ id, name }) => ({ id, name }))}
      choices={choices}
      start={isAdding ? { patient: known, serviceId: query.get("service") ?? "" } : null}
      zone={ctx.zone}
      today={dayOf(ctx.clock.now(), ctx.zone)}
    />
  );
}
