"use client";
import type { TherapistWeekView } from "@withy/contracts/diary";
import { readDate, shortDate, titleDate } from "@withy/core/date-words";
import { addDays } from "@withy/core/plain-date";
import { Button, ButtonLink } from "@withy/ui/button";
import { ChoiceLinks } from "@withy/ui/choice";
import { Glyph } from "@withy/ui/glyph";
import { Page, PageTitle } from "@withy/ui/page";
import { Skeleton } from "@withy/ui/skeleton";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useAwake } from "@/components/use-awake";
import { useTherapistWeek } from "../hooks/use-therapist-week";
import { span } from "../minute-words";
import { WeekList } from "./week-list";

const WeekCalendar = dynamic(() => import("./week-calendar").then((m) => m.WeekCalendar), {
  ssr: false,
  loading: () => <Skeleton lines={12} label="Loading the week" />,
});

export interface WeekScreenProps {
  first: TherapistWeekView;
  day: string;
  today: string;
  therapists: readonly { id: string; name: string }[];
  canBook: boolean;
}

/** One therapist's week. The calendar loads by itself; a phone and a printer get the same as a list. */
export function WeekScreen({ first, day: startDay, today, therapists, canBook }: WeekScreenProps) {
  const router = useRouter();
  const [day, setDay] = useState(startDay);
  const [therapistId, setTherapistId] = useState(first.therapist.id);
  const week = useTherapistWeek(therapistId, day, first).data ?? first;
  const go = (to: string, who = therapistId) => {
    setDay(to);
    setTherapistId(who);
    window.history.replaceState(null, "", `/diary/week?${new URLSearchParams({ therapist: who, day: to })}`);
  };
  const open = (visit: { id: string; siteId: string }, on: string) =>
    router.push(`/diary?${new URLSearchParams({ day: on, site: visit.siteId, at: visit.id })}`);
  useShortcut("previous", () => go(addDays(day, -7)));
  useShortcut("next", () => go(addDays(day, 7)));
  useShortcut("diary-today", () => go(today));
  useShortcut("book", () => router.push(`/diary/find?therapist=${therapistId}`), canBook);

  const monday = week.days[0]?.day ?? day;
  const visits = week.days.flatMap((one) => one.appointments).filter((a) => a.state !== "cancelled").length;
  const free = week.days.reduce((sum, one) => sum + one.freeMinutes, 0);
  return (
    <Page fit className="weekpage">
      <PageTitle
        title={`${week.therapist.name}, week of ${shortDate(monday, today)}`}
        lead={`${visits} ${visits === 1 ? "visit" : "visits"}, ${free > 0 ? `${span(free)} free` : "full"}`}
        beside={<WeekSteps monday={monday} today={today} onDay={go} />}
        actions={
          <>
            <TherapistSelect therapists={therapists} value={therapistId} onChange={(id) => go(day, id)} />
            <ChoiceLinks
              label="View"
              as={Link}
              items={[
                { href: `/diary?day=${day}`, label: "Day" },
                { href: "/diary/week", label: "Week", current: true },
              ]}
            />
            {canBook && (
              <ButtonLink as={Link} size="small" shortcut="B" href={`/diary/find?therapist=${therapistId}`}>
                Find a time
              </ButtonLink>
            )}
          </>
        }
      />
      <div className="weekwide">
        <WeekCalendar week={week} today={today} onOpen={open} />
      </div>
      <WeekList week={week} />
    </Page>
  );
}

function WeekSteps({
  monday,
  today,
  onDay,
}: {
  monday: string;
  today: string;
  onDay: (day: string) => void;
}) {
  const [text, setText] = useState("");
  const isAwake = useAwake();
  const found = text.trim() === "" ? null : readDate(text, today);
  return (
    <div className="btns daysteps">
      <Button
        size="small"
        aria-label={`Week of ${titleDate(addDays(monday, -7))}`}
        onClick={() => onDay(addDays(monday, -7))}
      >
        <Glyph name="left" />
      </Button>
      <Button size="small" shortcut="T" onClick={() => onDay(today)}>
        This week
      </Button>
      <Button
        size="small"
        aria-label={`Week of ${titleDate(addDays(monday, 7))}`}
        onClick={() => onDay(addDays(monday, 7))}
      >
        <Glyph name="right" />
      </Button>
      <form
        className="dayjump"
        onSubmit={(event) => {
          event.preventDefault();
          if (!found) return;
          onDay(found);
          setText("");
        }}
      >
        <label className="vh" htmlFor="week-jump">
          Go to the week of a day
        </label>
        <input
          id="week-jump"
          className="input"
          placeholder="in 2 weeks, 8 dec"
          autoComplete="off"
          disabled={!isAwake}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
        <output className="says small" htmlFor="week-jump">
          {found ? titleDate(found) : ""}
        </output>
      </form>
    </div>
  );
}

interface TherapistSelectProps {
  therapists: readonly { id: string; name: string }[];
  value: string;
  onChange: (id: string) => void;
}

function TherapistSelect({ therapists, value, onChange }: TherapistSelectProps) {
  if (therapists.length < 2) return null;
  return (
    <span className="select siteselect">
      <label className="vh" htmlFor="week-therapist">
        Therapist
      </label>
      <select
        id="week-therapist"
        className="input"
        value={value}
        onChange={(event) => onChange(event.target.value)}
      >
        {therapists.map((therapist) => (
          <option key={therapist.id} value={therapist.id}>
            {therapist.name}
          </option>
        ))}
      </select>
      <Glyph name="down" />
    </span>
  );
}
