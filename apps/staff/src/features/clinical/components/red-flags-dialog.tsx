"use client";
import {
  type FlagAnswer,
  readRedFlags,
  redFlagCaution,
  redFlagsFor,
} from "@withy/clinical/findings/red-flags";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Choice } from "@withy/ui/choice";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { recordRedFlags } from "../api-client";
import { useEpisodeWrite } from "../hooks/use-episode";

export interface RedFlagsDialogProps {
  episode: { id: string; region: string; redFlags: Readonly<Record<string, FlagAnswer>>; version: number };
  /** Told what was kept, so that the page shows it. */
  onSaved: (saved: { redFlags: Readonly<Record<string, FlagAnswer>>; version: number }) => void;
  onClose: () => void;
}

const answers = [
  { value: "not-asked", label: "Not asked" },
  { value: "absent", label: "No" },
  { value: "present", label: "Yes" },
];

/** The questions of the region, what to do where one is yes, and the caution that goes with them. */
export function RedFlagsDialog({ episode, onSaved, onClose }: RedFlagsDialogProps) {
  const [given, setGiven] = useState<Record<string, FlagAnswer>>({ ...episode.redFlags });
  const save = useEpisodeWrite(recordRedFlags);
  const groups = redFlagsFor(episode.region);
  const reading = readRedFlags(episode.region, given);
  const allNo = () =>
    setGiven((before) => {
      const open = groups
        .flatMap((group) => group.flags)
        .filter(({ key }) => (before[key] ?? "not-asked") === "not-asked");
      return {
        ...before,
        ...Object.fromEntries(open.map(({ key }): [string, FlagAnswer] => [key, "absent"])),
      };
    });
  const submit = () =>
    save.mutate(
      { episodeId: episode.id, version: episode.version, answers: given },
      {
        onSuccess: ({ redFlags, version }) => {
          onSaved({ redFlags, version });
          onClose();
        },
      },
    );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      place="side"
      title="Red flags"
      lead={redFlagCaution}
      actions={
        <Button kind="primary" busy={save.isPending} onClick={submit}>
          Keep the answers
        </Button>
      }
    >
      <ErrorSummary
        errors={save.error ? problemItems(save.error).map(({ message }) => ({ message })) : []}
        attempt={save.submittedAt}
      />
      {groups.map((group) => (
        <section key={group.key} className="flag-group">
          <h3>{group.concern}</h3>
          {group.flags.map(({ key, question }) => (
            <div key={key} className="flag">
              <span>{question}</span>
              <Choice
                label={question}
                options={answers}
                value={given[key] ?? "not-asked"}
                onChange={(value) => setGiven({ ...given, [key]: value as FlagAnswer })}
              />
            </div>
          ))}
          {reading.present.some((found) => found.concern === group.concern) && (
            <AlertLine tone={group.isEmergency ? "danger" : "warning"} live>
              {group.action}
            </AlertLine>
          )}
          <p className="small soft">{group.source.citation}</p>
        </section>
      ))}
      <p>
        <button type="button" className="linklike" onClick={allNo}>
          The rest were asked, all no
        </button>
      </p>
      <p className="soft small" role="status">
        {reading.words}
      </p>
    </Dialog>
  );
}
