"use client";
import type { Programme, ProgrammeMode } from "@withy/clinical/programmes/programme";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { shortDate } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/wall-clock";
import { Choice } from "@withy/ui/choice";
import { PageTitle } from "@withy/ui/page";
import Link from "next/link";
import type { ProgrammeDraft } from "../hooks/use-programme-draft";

const modeOptions = [
  { value: "timed", label: "Timed" },
  { value: "sets", label: "Sets and repetitions" },
];

const stateWords = {
  saved: "saved",
  changed: "not saved yet",
  saving: "saving",
  failed: "not saved",
  clash: "not saved",
} as const;

/** The time for today, the day for anything earlier. */
function savedWords(savedAt: string, zone: string): string {
  const at = new Date(savedAt);
  const day = dayOf(at, zone);
  const today = dayOf(new Date(), zone);
  return day === today ? timeOf(at, zone) : shortDate(day, today);
}

/** Patient, side and saved time are never out of sight. */
export function BuilderHead({
  view,
  kept,
  programme,
  onMode,
}: {
  view: ProgrammeView;
  kept: Pick<ProgrammeDraft, "state" | "draft" | "seen">;
  programme: Programme;
  onMode: (mode: ProgrammeMode) => void;
}) {
  const line = view.versions.find((one) => one.versionNumber === view.versionNumber);
  const said =
    kept.state === "saved" && line ? `saved ${savedWords(line.savedAt, view.zone)}` : stateWords[kept.state];
  return (
    <PageTitle
      title={<Link href={`/patients/${view.patient.id}/programme`}>{view.patient.name}</Link>}
      note={programme.mode === "timed" && programme.rounds > 1 ? `round 1 of ${programme.rounds}` : undefined}
      beside={<span className="side-badge">{view.episode.place}</span>}
      lead={
        <>
          {kept.draft.title}, version {view.versionNumber},{" "}
          <span role="status">{view.canWrite ? said : "to read"}</span>
        </>
      }
      actions={
        view.canWrite ? (
          <Choice
            label="How the session is counted"
            options={modeOptions}
            value={programme.mode}
            onChange={(mode) => onMode(mode as ProgrammeMode)}
          />
        ) : undefined
      }
    />
  );
}
