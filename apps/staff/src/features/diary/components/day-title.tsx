"use client";
import type { DiaryDayView } from "@withy/contracts/diary";
import { longDate, readDate, titleDate } from "@withy/core/date-words";
import { addDays } from "@withy/core/plain-date";
import { Button, ButtonLink } from "@withy/ui/button";
import { ChoiceLinks } from "@withy/ui/choice";
import { Glyph } from "@withy/ui/glyph";
import { PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { type FormEvent, useState } from "react";
import { useAwake } from "@/components/use-awake";

export interface DayTitleProps {
  day: DiaryDayView;
  today: string;
  sites: readonly { id: string; name: string }[];
  canBook: boolean;
  onDay: (day: string) => void;
  onSites: (siteIds: readonly string[]) => void;
  weekHref: string;
}

/** The day's name, steps to other days, the sites shown. */
export function DayTitle({ day, today, sites, canBook, onDay, onSites, weekHref }: DayTitleProps) {
  const { booked, waiting, gaps } = day.counts;
  const lead = `${booked} booked${waiting > 0 ? `, ${waiting} in the waiting room` : ""}${gaps > 0 ? `, ${gaps} ${gaps === 1 ? "gap" : "gaps"} to fill` : ""}`;
  return (
    <PageTitle
      title={titleDate(day.day)}
      note={day.sites
        .map((site) => site.closedReason && `${site.name} is closed: ${site.closedReason}`)
        .find(Boolean)}
      beside={<DaySteps day={day.day} today={today} onDay={onDay} />}
      lead={lead}
      actions={
        <>
          <SiteChoice day={day} sites={sites} onSites={onSites} />
          <ChoiceLinks
            label="View"
            as={Link}
            items={[
              { href: "/diary", label: "Day", current: true },
              { href: weekHref, label: "Week" },
            ]}
          />
          {canBook && (
            <>
              <ButtonLink as={Link} href="/diary/cover" size="small">
                Arrange cover
              </ButtonLink>
              <ButtonLink as={Link} href="/diary/find" size="small">
                Find a time
              </ButtonLink>
            </>
          )}
        </>
      }
    />
  );
}

function DaySteps({ day, today, onDay }: { day: string; today: string; onDay: (day: string) => void }) {
  const before = addDays(day, -1);
  const after = addDays(day, 1);
  return (
    <div className="btns daysteps">
      <Button size="small" aria-label={longDate(before)} onClick={() => onDay(before)}>
        <Glyph name="left" />
      </Button>
      <Button size="small" shortcut="T" onClick={() => onDay(today)}>
        Today
      </Button>
      <Button size="small" aria-label={longDate(after)} onClick={() => onDay(after)}>
        <Glyph name="right" />
      </Button>
      <DayJump today={today} onDay={onDay} />
    </div>
  );
}

/** A day in words: "next tue", "8 dec", "in 2 weeks". */
function DayJump({ today, onDay }: { today: string; onDay: (day: string) => void }) {
  const [text, setText] = useState("");
  const [isWrong, setIsWrong] = useState(false);
  const isAwake = useAwake();
  const day = text.trim() === "" ? null : readDate(text, today);
  const go = (event: FormEvent) => {
    event.preventDefault();
    setIsWrong(day === null && text.trim() !== "");
    if (day === null) return;
    onDay(day);
    setText("");
  };
  return (
    <form className="dayjump" onSubmit={go}>
      <label className="vh" htmlFor="day-jump">
        Go to a day
      </label>
      <input
        id="day-jump"
        className="input"
        placeholder="next tue, 8 dec"
        autoComplete="off"
        disabled={!isAwake}
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          setIsWrong(false);
        }}
        aria-invalid={isWrong || undefined}
        aria-describedby="day-jump-says"
      />
      <output id="day-jump-says" className="says small" htmlFor="day-jump">
        {day ? titleDate(day) : isWrong ? "Not a day. Type 8 Dec, tomorrow or next Tuesday" : ""}
      </output>
    </form>
  );
}

function SiteChoice({ day, sites, onSites }: Pick<DayTitleProps, "day" | "sites" | "onSites">) {
  if (sites.length < 2) return null;
  const isAll = day.sites.length === sites.length;
  return (
    <span className="select siteselect">
      <label className="vh" htmlFor="day-site">
        Site
      </label>
      <select
        id="day-site"
        className="input"
        value={isAll ? "all" : (day.sites[0]?.id ?? "")}
        onChange={(event) =>
          onSites(event.target.value === "all" ? sites.map((s) => s.id) : [event.target.value])
        }
      >
        {sites.map((site) => (
          <option key={site.id} value={site.id}>
            {site.name}
          </option>
        ))}
        <option value="all">All sites</option>
      </select>
      <Glyph name="down" />
    </span>
  );
}
