import type { TimelineEntry } from "@withy/contracts/patients";
import { Glyph } from "@withy/ui/glyph";
import { Edge, edgeGlyph } from "@withy/ui/state-mark";
import Link from "next/link";
import { appointmentStateLook } from "@/components/appointment-state-mark";
import { shortDay } from "../short-day";
import { entryWords } from "../timeline-words";

interface Props {
  entry: TimelineEntry;
  patientId: string;
  today: string;
  /** Named above the first line of an earlier year. */
  year: string | null;
}

/** One thing that happened: when in the gutter, what on the line. */
export function TimelineLine({ entry, patientId, today, year }: Props) {
  const { title, detail, href } = entryWords(entry, patientId);
  const look = entry.kind === "visit" ? appointmentStateLook(entry.state) : null;
  const isStruck = look?.edge === "struck";
  const words = isStruck ? <s>{title}</s> : title;
  return (
    <li>
      <span className="gut num tick">
        <b>{shortDay(entry.day, today)}</b>
        {year === null && <span className="soft"> {entry.time}</span>}
      </span>
      <div className="in">
        {look ? <Edge edge={look.edge} /> : <span />}
        <span className="gl">{look && <Glyph name={edgeGlyph(look.edge)} />}</span>
        <span className="a1">{href === null ? words : <Link href={href}>{words}</Link>}</span>
        <span className="a2 soft">
          {look && !isStruck && <span className="word">{look.label}. </span>}
          {detail}
        </span>
      </div>
    </li>
  );
}
