"use client";
import type { TimelineEntry, TimelineKind, TimelineView } from "@withy/contracts/patients";
import { Button } from "@withy/ui/button";
import { Choice } from "@withy/ui/choice";
import { EmptyState } from "@withy/ui/empty-state";
import { SectionHead } from "@withy/ui/section-head";
import { Skeleton } from "@withy/ui/skeleton";
import { useState } from "react";
import { useTimeline } from "../hooks/use-timeline";
import { TimelineLine } from "./timeline-line";

interface Props {
  patientId: string;
  title: string;
  aside: string;
  today: string;
  first: TimelineView;
  /** The kinds that this person's roles show. */
  kinds: readonly { value: TimelineKind; label: string }[];
}

/** Everything once, newest first, with each year named where it begins. */
export function Timeline({ patientId, title, aside, today, first, kinds }: Props) {
  const [kind, setKind] = useState<TimelineKind>("all");
  const line = useTimeline(patientId, kind, first);
  const entries = line.data?.pages.flatMap((page) => page.entries) ?? [];
  return (
    <section className="tl" aria-labelledby="timeline-title">
      <div className="tlhead">
        <span className="gut note">newest first</span>
        <SectionHead
          id="timeline-title"
          title={title}
          aside={aside}
          action={
            kinds.length > 2 && (
              <Choice
                label="Show"
                options={kinds}
                value={kind}
                onChange={(value) => setKind(value as TimelineKind)}
              />
            )
          }
        />
      </div>
      {line.error && <p className="tlmore danger">{line.error.message}</p>}
      {line.isPending && <Skeleton lines={6} label="The timeline is being read" />}
      <ol>
        {entries.map((entry, i) => (
          <TimelineLine
            key={`${entry.kind}${entry.id}`}
            entry={entry}
            patientId={patientId}
            today={today}
            year={yearBreak(entries, i, today)}
          />
        ))}
      </ol>
      {line.isSuccess && entries.length === 0 && (
        <div className="tlmore">
          <EmptyState title="Nothing here yet.">
            Visits, notes, letters and money appear here as they happen.
          </EmptyState>
        </div>
      )}
      {line.hasNextPage && (
        <p className="tlmore">
          <Button size="small" busy={line.isFetchingNextPage} onClick={() => void line.fetchNextPage()}>
            Show what came before
          </Button>
        </p>
      )}
    </section>
  );
}

function yearBreak(entries: readonly TimelineEntry[], i: number, today: string): string | null {
  const year = entries[i]?.day.slice(0, 4) ?? "";
  const above = entries[i - 1]?.day.slice(0, 4) ?? today.slice(0, 4);
  return year === above ? null : year;
}
