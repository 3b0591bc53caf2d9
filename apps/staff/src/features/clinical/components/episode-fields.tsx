"use client";
import { problemsOf } from "@withy/clinical/episodes/problems";
import { regions, type Side, sideLabels, sides } from "@withy/clinical/episodes/sides";
import { type ReferralSource, referralSourceLabels, referralSources } from "@withy/clinical/episodes/states";
import { Choice } from "@withy/ui/choice";
import { FieldGroup } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextArea, TextInput } from "@withy/ui/text-input";
import type { TypedEpisode } from "../typed-episode";

export interface EpisodeFieldsProps {
  typed: TypedEpisode;
  sites: readonly { id: string; name: string }[];
  onChange: (change: Partial<TypedEpisode>) => void;
  problem: (id: string) => string | undefined;
}

/** What is asked when an episode is opened: the place and side first. */
export function EpisodeFields({ typed, sites, onChange, problem }: EpisodeFieldsProps) {
  return (
    <>
      <Select
        id="region"
        label="Region"
        placeholder="Choose the region"
        value={typed.region}
        onChange={(event) => onChange({ region: event.target.value })}
        options={regions.map(({ key, label }) => ({ value: key, label }))}
        error={problem("region")}
      />
      <FieldGroup legend="Side" id="side" error={problem("side")}>
        <div id="side" tabIndex={-1}>
          <Choice
            label="Side"
            options={sides.map((side) => ({ value: side, label: sideLabels[side] }))}
            value={typed.side}
            onChange={(value) => onChange({ side: value as Side })}
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
        onChange={(event) => onChange({ problem: event.target.value })}
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
        onChange={(event) => onChange({ referralSource: event.target.value as ReferralSource })}
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
          onChange={(event) => onChange({ referredBy: event.target.value })}
          error={problem("referredBy")}
        />
      )}
      <TextArea
        id="goals"
        label="Goals"
        hint="One a line, in the patient's words."
        rows={3}
        value={typed.goals}
        onChange={(event) => onChange({ goals: event.target.value })}
        error={problem("goals")}
      />
      <TextInput
        id="plannedVisits"
        label="Planned visits"
        hint="Leave empty where you do not know yet."
        span="short"
        inputMode="numeric"
        value={typed.plannedVisits}
        onChange={(event) => onChange({ plannedVisits: event.target.value })}
        error={problem("plannedVisits")}
      />
      {sites.length > 1 && (
        <Select
          id="siteId"
          label="Site"
          value={typed.siteId}
          onChange={(event) => onChange({ siteId: event.target.value })}
          options={sites.map(({ id, name }) => ({ value: id, label: name }))}
        />
      )}
    </>
  );
}
