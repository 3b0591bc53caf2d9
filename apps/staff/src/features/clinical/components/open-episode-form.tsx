"use client";
import { problemsOf } from "@withy/clinical/episodes/problems";
import { checkSide, regions, type Side, sideLabels, sides } from "@withy/clinical/episodes/sides";
import { type ReferralSource, referralSourceLabels, referralSources } from "@withy/clinical/episodes/states";
import { Button, ButtonLink, Buttons } from "@withy/ui/button";
import { Choice } from "@withy/ui/choice";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { PageBody } from "@withy/ui/page";
import { Select } from "@withy/ui/select";
import { TextArea, TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useOpenEpisode } from "../hooks/use-open-episode";
import { useStartNote } from "../hooks/use-start-note";
import { RecordTitle } from "./record-title";

export interface OpenEpisodeFormProps {
  patientId: string;
  sites: readonly { id: string; name: string }[];
  deskSiteId: string;
  /** The visit that it is opened for: its note is begun at once. */
  visitId: string | null;
}

interface Typed {
  siteId: string;
  region: string;
  side: Side | "";
  problem: string;
  referralSource: ReferralSource;
  referredBy: string;
  reason: string;
  goals: string;
  plannedVisits: string;
}

/** What is missing or does not fit, in the words of the rule. */
function problemsIn(typed: Typed): FieldError[] {
  const side =
    typed.side === ""
      ? "Choose a side, or no side."
      : typed.region === ""
        ? null
        : checkSide(typed.region, typed.side);
  return [
    typed.region === "" ? { id: "region", message: "Choose the region from the list." } : null,
    side === null ? null : { id: "side", message: side },
    typed.problem.trim() === "" ? { id: "problem", message: "Enter the problem in a few words." } : null,
    typed.plannedVisits !== "" && !/^\d+$/.test(typed.plannedVisits.trim())
      ? { id: "plannedVisits", message: "Enter a whole number of visits." }
      : null,
  ].filter((found) => found !== null);
}

/** Opens a course of care: where, which side, what for. */
export function OpenEpisodeForm({ patientId, sites, deskSiteId, visitId }: OpenEpisodeFormProps) {
  const router = useRouter();
  const open = useOpenEpisode();
  const start = useStartNote();
  const [typed, setTyped] = useState<Typed>({
    siteId: sites.find((site) => site.id === deskSiteId)?.id ?? sites[0]?.id ?? "",
    region: "",
    side: "",
    problem: "",
    referralSource: "self",
    referredBy: "",
    reason: "",
    goals: "",
    plannedVisits: "",
  });
  const [found, setFound] = useState<FieldError[]>([]);
  const set = (change: Partial<Typed>) => setTyped((before) => ({ ...before, ...change }));
  const failed = open.error ?? start.error;
  const errors = found.length > 0 ? found : failed ? problemItems(failed) : [];
  const problem = (id: string) => errors.find((error) => error.id === id)?.message;
  const submit = () => {
    const problems = problemsIn(typed);
    setFound(problems);
    if (problems.length > 0 || typed.side === "") return;
    const { goals, plannedVisits, side, ...rest } = typed;
    open.mutate(
      {
        ...rest,
        side,
        patientId,
        appointmentId: visitId,
        goals: goals
          .split("\n")
          .map((goal) => goal.trim())
          .filter((goal) => goal !== ""),
        plannedVisits: plannedVisits.trim() === "" ? null : Number(plannedVisits),
      },
      {
        onSuccess: (episode) =>
          visitId === null
            ? router.push(`/patients/${patientId}/episodes/${episode.id}`)
            : start.mutate({ appointmentId: visitId, episodeId: episode.id }),
      },
    );
  };
  return (
    <>
      <RecordTitle title="Open an episode" aside="one problem, from first visit to discharge" />
      <PageBody>
        <form
          className="episode-form"
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            submit();
          }}
        >
          <ErrorSummary errors={errors} attempt={open.submittedAt + found.length} />
          <Select
            id="region"
            label="Region"
            placeholder="Choose the region"
            value={typed.region}
            onChange={(event) => set({ region: event.target.value })}
            options={regions.map(({ key, label }) => ({ value: key, label }))}
            error={problem("region")}
          />
          <FieldGroup legend="Side" id="side" error={problem("side")}>
            <div id="side" tabIndex={-1}>
              <Choice
                label="Side"
                options={sides.map((side) => ({ value: side, label: sideLabels[side] }))}
                value={typed.side}
                onChange={(value) => set({ side: value as Side })}
              />
            </div>
          </FieldGroup>
          <TextInput
            id="problem"
            label="Working problem"
            hint="In your words. It can be one from the list that opens."
            list="problems"
            maxLength={160}
            value={typed.problem}
            onChange={(event) => set({ problem: event.target.value })}
            error={problem("problem")}
          />
          <datalist id="problems">
            {problemsOf(typed.region).map((name) => (
              <option key={name} value={name} />
            ))}
          </datalist>
          <Select
            id="referralSource"
            label="Who sent the patient"
            value={typed.referralSource}
            onChange={(event) => set({ referralSource: event.target.value as ReferralSource })}
            options={referralSources.map((source) => ({
              value: source,
              label: referralSourceLabels[source],
            }))}
          />
          {typed.referralSource !== "self" && (
            <TextInput
              id="referredBy"
              label="Name of the referrer"
              maxLength={160}
              value={typed.referredBy}
              onChange={(event) => set({ referredBy: event.target.value })}
              error={problem("referredBy")}
            />
          )}
          <TextArea
            id="goals"
            label="Goals"
            hint="One a line, in the patient's words."
            rows={3}
            value={typed.goals}
            onChange={(event) => set({ goals: event.target.value })}
            error={problem("goals")}
          />
          <TextInput
            id="plannedVisits"
            label="Planned visits"
            hint="Leave empty where you do not know yet."
            span="short"
            inputMode="numeric"
            value={typed.plannedVisits}
            onChange={(event) => set({ plannedVisits: event.target.value })}
            error={problem("plannedVisits")}
          />
          {sites.length > 1 && (
            <Select
              id="siteId"
              label="Site"
              value={typed.siteId}
              onChange={(event) => set({ siteId: event.target.value })}
              options={sites.map(({ id, name }) => ({ value: id, label: name }))}
            />
          )}
          <Buttons>
            <Button kind="primary" type="submit" busy={open.isPending || start.isPending}>
              {visitId === null ? "Open the episode" : "Open it and write the note"}
            </Button>
            <ButtonLink as={Link} href={`/patients/${patientId}/episodes`}>
              Leave it
            </ButtonLink>
          </Buttons>
        </form>
      </PageBody>
    </>
  );
}
