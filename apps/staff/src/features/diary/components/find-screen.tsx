"use client";
import type { AppointmentView, BookingChoicesView, FoundTimeView } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, ButtonLink } from "@withy/ui/button";
import type { ComboboxOption } from "@withy/ui/combobox";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageTitle } from "@withy/ui/page";
import { Skeleton } from "@withy/ui/skeleton";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useDeferredValue, useMemo, useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { relaxed, timesQuery, type Wishes } from "../find-wishes";
import { useFoundTimes } from "../hooks/use-found-times";
import { usePutAside } from "../hooks/use-put-aside";
import { asideFinding } from "../put-aside-typed";
import { addHref } from "../waiting-address";
import { wantedTime } from "../wanted-time";
import { FoundDay } from "./found-day";
import { FoundTimes } from "./found-times";
import { WishesForm } from "./wishes-form";

const BookingDialog = dynamic(() => import("./booking-dialog").then((m) => m.BookingDialog));

export interface FindScreenProps {
  choices: BookingChoicesView;
  start: Wishes;
  startPatient: ComboboxOption | null;
  /** What these wishes lie in the tray as, where they were taken up from it. */
  asideId: string | null;
  today: string;
}

/** The chosen time as the first of a course, for the same patient and service. */
function courseHref(wishes: Wishes, patient: ComboboxOption | null, time: FoundTimeView | undefined): string {
  const query = new URLSearchParams();
  if (patient) query.set("patient", patient.id);
  if (wishes.serviceId) query.set("service", wishes.serviceId);
  if (time) {
    query.set("therapist", time.therapist.id);
    query.set("site", time.site.id);
    query.set("on", time.day);
    query.set("at", time.startTime);
  }
  return `/diary/course?${query}`;
}

/** Why this time and not that one: wishes on the left, times in the middle, the day it lands in on the right. */
export function FindScreen({ choices, start, startPatient, asideId, today }: FindScreenProps) {
  const router = useRouter();
  const [wishes, setWishes] = useState(start);
  const [patient, setPatient] = useState(startPatient);
  const [chosen, setChosen] = useState(0);
  const [booking, setBooking] = useState<FoundTimeView | null>(null);
  const question = useMemo(() => timesQuery(wishes, patient?.id ?? null), [wishes, patient]);
  const found = useFoundTimes(useDeferredValue(question));
  const times = found.data?.times ?? [];
  const chosenTime = times[Math.min(chosen, times.length - 1)];
  const change = (part: Partial<Wishes>) => {
    setWishes((before) => ({ ...before, ...part }));
    setChosen(0);
  };
  useShortcut("book", () => chosenTime && setBooking(chosenTime), chosenTime !== undefined);
  const putAside = usePutAside();
  const lay = () => {
    const service = choices.services.find(({ id }) => id === wishes.serviceId);
    putAside.mutate(asideFinding(wishes, patient, service?.name, asideId), {
      onSuccess: () => router.push("/diary"),
    });
  };
  useShortcut("put-aside", lay, booking === null);
  const show = (view: AppointmentView) =>
    router.push(`/diary?${new URLSearchParams({ day: view.day, site: view.site.id, at: view.id })}`);

  return (
    <Page fit className="findpage">
      <div className="findwishes">
        <PageTitle
          title="Find a time"
          actions={
            <>
              <ButtonLink size="small" as={Link} href={courseHref(wishes, patient, chosenTime)}>
                As a course
              </ButtonLink>
              <Button size="small" shortcut="Ctrl ." busy={putAside.isPending} onClick={lay}>
                Put aside
              </Button>
            </>
          }
        />
        <WishesForm
          choices={choices}
          wishes={wishes}
          onChange={change}
          patient={patient}
          onPatient={setPatient}
          seenBy={found.data?.seenBy ?? []}
          today={today}
        />
      </div>
      <div className="findlist">
        {putAside.error && (
          <AlertLine tone="danger" live>
            {problemItems(putAside.error)[0]?.message}
          </AlertLine>
        )}
        {found.error && (
          <AlertLine tone="danger" live>
            {problemItems(found.error)[0]?.message}
          </AlertLine>
        )}
        {question === null && (
          <EmptyState title="Choose what the visit is for.">
            The best times come here at once, and again with every wish that you add.
          </EmptyState>
        )}
        {question !== null && found.isPending && <Skeleton lines={9} label="Looking for times" />}
        {question !== null && found.data && (
          <FoundTimes
            found={found.data}
            isLooking={found.isFetching}
            chosen={Math.min(chosen, times.length - 1)}
            onChoose={setChosen}
            onBook={setBooking}
            onRelax={(wish) => change(relaxed(wish))}
            waitHref={addHref({ patientId: patient?.id ?? null, serviceId: wishes.serviceId })}
          />
        )}
      </div>
      {question !== null && chosenTime && <FoundDay times={times} chosen={chosenTime} onChoose={setChosen} />}
      {booking && (
        <BookingDialog
          start={{
            wanted: wantedTime({
              day: booking.day,
              time: booking.startTime,
              siteId: booking.site.id,
              therapistId: booking.therapist.id,
              roomId: booking.room.id,
            }),
            patient,
            serviceId: wishes.serviceId,
            asideId,
          }}
          choices={choices}
          today={today}
          onClose={() => setBooking(null)}
          onBooked={show}
        />
      )}
    </Page>
  );
}
