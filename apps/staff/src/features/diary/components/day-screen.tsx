"use client";
import type { DayAppointment, DiaryDayView, PutAsideItem } from "@withy/contracts/diary";
import { addDays } from "@withy/core/plain-date";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Page } from "@withy/ui/page";
import { useRouter } from "next/navigation";
import { useState } from "react";
import type { DayFilters } from "../api-client";
import { writeDayAddress } from "../day-address";
import { type Cursor, placeAt, stepMinutes } from "../day-cursor";
import { useDayAddress } from "../hooks/use-day-address";
import { useDayKeys } from "../hooks/use-day-keys";
import { useDayVerbs } from "../hooks/use-day-verbs";
import { useDiaryDay } from "../hooks/use-diary-day";
import { useHolds } from "../hooks/use-holds";
import { useNowMinute } from "../hooks/use-now-minute";
import { DayAgenda } from "./day-agenda";
import { DayDialogs, type OpenDialog } from "./day-dialogs";
import { DayGrid } from "./day-grid";
import { DaySheet } from "./day-sheet";
import { DayTitle } from "./day-title";
import { DeskVerbs } from "./desk-verbs";
import { DiaryFoot } from "./diary-foot";
import { HeldWords } from "./held-times";

export interface DayScreenProps {
  first: { filters: DayFilters; day: DiaryDayView };
  sites: readonly { id: string; name: string }[];
  today: string;
  may: { book: boolean; mark: boolean; cancel: boolean };
}

function startCursor(day: DiaryDayView): Cursor {
  const minute = day.nowMinute ?? day.columns[0]?.hours[0]?.fromMinute ?? day.bounds.fromMinute;
  return { column: 0, minute: Math.floor(minute / stepMinutes) * stepMinutes };
}

function visitById(day: DiaryDayView, id: string | null): DayAppointment | null {
  return day.columns.flatMap((column) => column.appointments).find((visit) => visit.id === id) ?? null;
}

/** The week of whoever gives the open visit, else of the column under the cursor. */
function weekHref(day: DiaryDayView, cursor: Cursor, chosen: DayAppointment | null): string {
  const column = day.by === "therapist" ? day.columns[cursor.column]?.id : undefined;
  const therapist = chosen?.therapistId ?? column;
  return `/diary/week?${new URLSearchParams({ day: day.day, ...(therapist ? { therapist } : {}) })}`;
}

/** The day's diary: grid, agenda on a phone, the sheet of one visit, and the dialogs of its verbs. */
export function DayScreen({ first, sites, today, may }: DayScreenProps) {
  const router = useRouter();
  const { address, change } = useDayAddress();
  const filters: DayFilters = { day: address.day, siteIds: address.siteIds, by: address.by };
  const day = useDiaryDay(filters, first).data ?? first.day;
  const siteIds = day.sites.map((site) => site.id);
  const held = useHolds(siteIds);
  const now = useNowMinute(day.nowMinute);
  const [cursor, setCursor] = useState(() => startCursor(first.day));
  const [dialog, setDialog] = useState<OpenDialog>(null);
  const verbs = useDayVerbs(day);

  const under = placeAt(day, cursor);
  const chosen = visitById(day, address.at);
  const target = chosen ?? (under.kind === "appointment" ? under.appointment : null);
  const open = (visit: DayAppointment) => change({ at: visit.id });
  const close = () => {
    change({ at: null });
    document.querySelector<HTMLElement>(".daygrid [data-cursor]")?.focus();
  };
  const goTo = (to: string) => change({ day: to === today ? undefined : to, at: null });
  const book = () => {
    const isTaken = target !== null && target.state !== "cancelled";
    if (isTaken) router.push(`/diary/find?patient=${target.patientId}`);
    else setDialog({ kind: "book", cursor });
  };
  const takeUp = (item: PutAsideItem) => {
    if (item.kind === "finding") router.push(`/diary/find?aside=${item.id}`);
    else setDialog({ kind: "resume", item });
  };
  useDayKeys({
    target,
    may,
    onBook: book,
    onMove: () => target && setDialog({ kind: "move", id: target.id }),
    onCancel: () => target && setDialog({ kind: "cancel", id: target.id }),
    onMark: verbs.mark,
    // From the day that was asked for, so that quick presses add up while a day is still being read.
    onStep: (days) => goTo(addDays(address.day ?? today, days)),
    onToday: () => goTo(today),
  });

  return (
    <Page fit className={address.at ? "daypage withsheet" : "daypage"}>
      <DayTitle
        day={day}
        today={today}
        sites={sites}
        canBook={may.book}
        onDay={goTo}
        onSites={(siteIds) => change({ siteIds, at: null })}
        weekHref={weekHref(day, cursor, chosen)}
      />
      <div className="dayalert">
        {verbs.problem && (
          <AlertLine tone="danger" live>
            {verbs.problem}{" "}
            <Button kind="plain" size="small" onClick={verbs.clear}>
              Close
            </Button>
          </AlertLine>
        )}
      </div>
      {day.columns.length === 0 ? (
        <div className="daynone">
          <EmptyState title="No one works here on this day.">Choose another day or site above.</EmptyState>
        </div>
      ) : (
        <>
          <DayGrid
            day={day}
            today={today}
            now={now}
            held={held}
            cursor={cursor}
            onCursor={setCursor}
            chosenId={address.at}
            onOpen={open}
            onBook={() => may.book && book()}
            onDrop={may.book ? verbs.drop : undefined}
            onColumns={(by) => change({ by, at: null })}
          />
          <DayAgenda day={day} now={now} chosenId={address.at} onOpen={open} />
        </>
      )}
      {address.at && (
        <DaySheet
          id={address.at}
          chosen={chosen}
          today={today}
          may={may}
          verbs={verbs}
          dialog={dialog}
          onDialog={setDialog}
          onClose={close}
        />
      )}
      <HeldWords day={day} held={held} />
      <DiaryFoot siteIds={siteIds} canUndo={may.mark}>
        <DeskVerbs
          mayBook={may.book}
          address={writeDayAddress({ ...address, day: undefined, at: null })}
          day={address.day}
          onTakeUp={takeUp}
        />
      </DiaryFoot>
      <DayDialogs
        dialog={dialog}
        day={day}
        today={today}
        onClose={() => setDialog(null)}
        onShow={(view) => {
          setDialog(null);
          const isShown = day.sites.some((site) => site.id === view.site.id);
          const siteIds = isShown ? address.siteIds : [view.site.id];
          change({ at: view.id, day: view.day === today ? undefined : view.day, siteIds });
        }}
      />
    </Page>
  );
}
