"use client";
import type { TodayArrival, TodayView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { timeOf } from "@withy/core/wall-clock";
import { AlertLine } from "@withy/ui/alert-line";
import { ButtonLink } from "@withy/ui/button";
import { ChoiceLinks } from "@withy/ui/choice";
import { Page, PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { useRouter } from "next/navigation";
import type { ReactNode } from "react";
import { problemItems } from "@/api/form-problems";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useClock } from "../hooks/use-clock";
import { useMarkArrival } from "../hooks/use-mark-arrival";
import { useToday } from "../hooks/use-today";
import { Arrivals } from "./arrivals";
import { TodaySide } from "./today-side";

export interface TodayScreenProps {
  first: TodayView;
  siteIds: readonly string[];
  /** Every site this person reaches; the desk's own first. */
  sites: readonly { id: string; name: string }[];
  zone: string;
  now: string;
  may: { book: boolean; mark: boolean };
  /** The strip at the foot. */
  foot: ReactNode;
}

function leadWords(counts: TodayView["counts"]): string {
  const parts = [
    counts.toCome === 0
      ? "No one more to come."
      : `${counts.toCome} to come, the last at ${counts.lastTime ?? "no set time"}.`,
    counts.waiting > 0
      ? `${counts.waiting} in the waiting room, longest ${counts.longestWaitMinutes ?? 0} minutes.`
      : "",
  ];
  return parts.filter(Boolean).join(" ");
}

function SeenNote({ counts }: { counts: TodayView["counts"] }) {
  if (counts.seen + counts.didNotAttend === 0) return null;
  return (
    <>
      {counts.seen} seen
      {counts.didNotAttend > 0 && (
        <>
          ,<br />
          {counts.didNotAttend} did not come
        </>
      )}
    </>
  );
}

/** What is next at this desk. */
export function TodayScreen({ first, siteIds, sites, zone, now: serverNow, may, foot }: TodayScreenProps) {
  const router = useRouter();
  const view = useToday(siteIds, first).data;
  const now = useClock(serverNow);
  const mark = useMarkArrival();
  useShortcut("book", () => router.push("/diary/find"), may.book);
  const markLine = (a: TodayArrival) => {
    if (a.nextMark && !mark.isPending)
      mark.mutate({ appointmentId: a.appointmentId, version: a.version, to: a.nextMark });
  };
  const isAll = view.sites.length > 1;
  const all = new URLSearchParams(sites.map((site) => ["site", site.id]));
  return (
    <Page fit className="todaypage">
      <PageTitle
        title={`Today, ${titleDate(view.day)}`}
        note={<SeenNote counts={view.counts} />}
        lead={leadWords(view.counts)}
        actions={
          <>
            {sites.length > 1 && (
              <ChoiceLinks
                label="Sites"
                as={Link}
                items={[
                  {
                    href: "/today",
                    label: isAll ? "This desk" : (view.sites[0]?.name ?? "This desk"),
                    current: !isAll,
                  },
                  { href: `/today?${all}`, label: "All sites", current: isAll },
                ]}
              />
            )}
            {may.book && (
              <ButtonLink as={Link} kind="primary" size="small" shortcut="B" href="/diary/find">
                Book
              </ButtonLink>
            )}
          </>
        }
      />
      <div className="todayalert">
        {mark.error && (
          <AlertLine tone="danger" live>
            {problemItems(mark.error)[0]?.message}
          </AlertLine>
        )}
      </div>
      <div className="todaycols">
        <Arrivals view={view} now={now} clock={timeOf(now, zone)} onMark={may.mark ? markLine : undefined} />
        <TodaySide view={view} canBook={may.book} />
      </div>
      {foot}
    </Page>
  );
}
