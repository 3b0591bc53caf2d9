"use client";
import type { TodayArrival, TodayView } from "@withy/contracts/diary";
import { Button } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { NowLine } from "@withy/ui/line";
import { SectionHead } from "@withy/ui/section-head";
import { type KeyboardEvent, useRef, useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { ArrivalLine } from "./arrival-line";

export interface ArrivalsProps {
  view: TodayView;
  now: Date;
  /** The present time by the site's clock. */
  clock: string;
  onMark: ((arrival: TodayArrival) => void) | undefined;
}

/** The line to begin on: the first that has not begun yet, else the last. */
function firstAhead(arrivals: readonly TodayArrival[], now: Date): string | null {
  const ahead = arrivals.find((a) => Date.parse(a.startsAt) > now.getTime() && a.nextMark !== null);
  return (ahead ?? arrivals.at(-1))?.appointmentId ?? null;
}

/** The arrivals of the day by time. Arrows choose a line, the key at its end does the next step. */
export function Arrivals({ view, now, clock, onMark }: ArrivalsProps) {
  const list = useRef<HTMLDivElement>(null);
  const [chosen, setChosen] = useState<string | null>(null);
  const [showsDone, setShowsDone] = useState(false);
  const lines = showsDone ? [...view.done, ...view.arrivals] : view.arrivals;
  const current =
    lines.find((a) => a.appointmentId === chosen)?.appointmentId ?? firstAhead(view.arrivals, now);
  const target = lines.find((a) => a.appointmentId === current) ?? null;
  const ahead = lines.findIndex((a) => Date.parse(a.startsAt) > now.getTime());

  const may = (mark: TodayArrival["nextMark"]) => onMark !== undefined && target?.nextMark === mark;
  const act = () => target && onMark?.(target);
  useShortcut("arrive", act, may("arrived"));
  useShortcut("start", act, may("in-session"));
  useShortcut("finish", act, may("fulfilled"));

  const onKeyDown = (event: KeyboardEvent) => {
    const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
    const next = lines[lines.findIndex((a) => a.appointmentId === current) + step];
    if (step === 0 || !next) return;
    event.preventDefault();
    setChosen(next.appointmentId);
    requestAnimationFrame(() => list.current?.querySelector<HTMLElement>('[data-line="chosen"]')?.focus());
  };

  return (
    <section className="todayleft" aria-labelledby="arrivals">
      <div className="todayhead">
        <SectionHead
          title="Arrivals"
          id="arrivals"
          aside={
            onMark && lines.length > 0
              ? "arrows choose a line, the key at its end does the next step"
              : undefined
          }
          action={
            view.done.length > 0 && (
              <Button
                kind="plain"
                size="small"
                aria-expanded={showsDone}
                onClick={() => setShowsDone(!showsDone)}
              >
                {showsDone ? "Hide what is over" : `${view.done.length} over`}
              </Button>
            )
          }
        />
      </div>
      {/* biome-ignore lint/a11y/noStaticElementInteractions: arrows move between the links of the lines inside */}
      <div ref={list} onKeyDown={onKeyDown}>
        {lines.length === 0 && (
          <div className="todaynone">
            <EmptyState title="No one else is expected today.">
              Free times are beside; book into them with B.
            </EmptyState>
          </div>
        )}
        {lines.map((arrival, i) => (
          <div key={arrival.appointmentId}>
            {i === ahead && <NowLine time={clock} />}
            <ArrivalLine
              arrival={arrival}
              showsTime={lines[i - 1]?.startTime !== arrival.startTime}
              isChosen={arrival.appointmentId === current}
              onChoose={() => setChosen(arrival.appointmentId)}
              onMark={onMark && (() => onMark(arrival))}
            />
          </div>
        ))}
        {ahead === -1 && lines.length > 0 && <NowLine time={clock} />}
      </div>
    </section>
  );
}
