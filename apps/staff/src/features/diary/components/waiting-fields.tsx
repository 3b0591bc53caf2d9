"use client";
import type { BookingChoicesView } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { urgencies, urgencyWords, weekdayNames } from "@withy/diary/waiting-words";
import { Choice, ManyChoice } from "@withy/ui/choice";
import { DateEntry } from "@withy/ui/date-entry";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { useVisitsAhead } from "../hooks/use-waiting";
import type { WaitingForm } from "../waiting-form";

interface Props {
  form: WaitingForm;
  onChange: (part: Partial<WaitingForm>) => void;
  choices: BookingChoicesView;
  patientId: string | null;
  today: string;
  errorOf: (id: string) => string | undefined;
}

const days = weekdayNames
  .slice(0, 6)
  .map((fullLabel, i) => ({ value: String(i + 1), label: fullLabel.slice(0, 3), fullLabel }));
const parts = ["morning", "afternoon", "evening"].map((value) => ({ value, label: `${value}s` }));

/** What they wait for, and what they would take. */
export function WaitingFields({ form, onChange, choices, patientId, today, errorOf }: Props) {
  const service = choices.services.find((one) => one.id === form.serviceId);
  const therapists = choices.therapists.filter((t) => !service || service.therapistIds.includes(t.id));
  return (
    <>
      <Select
        id="waiting-serviceId"
        label="For"
        placeholder="Choose what the visit is for"
        value={form.serviceId}
        onChange={(event) => onChange({ serviceId: event.target.value })}
        options={choices.services.map((s) => ({ value: s.id, label: `${s.name}, ${s.durationMinutes} min` }))}
        error={errorOf("waiting-serviceId")}
      />
      <div className="field">
        <span className="label">How urgent</span>
        <Choice
          label="How urgent"
          options={urgencies.map((value) => ({ value, label: urgencyWords[value] }))}
          value={form.urgency}
          onChange={(value) => onChange({ urgency: value as WaitingForm["urgency"] })}
        />
      </div>
      <Wish
        label="Days"
        options={days}
        value={form.weekdays}
        onChange={(weekdays) => onChange({ weekdays })}
      />
      <Wish
        label="Parts of the day"
        options={parts}
        value={form.partsOfDay}
        onChange={(partsOfDay) => onChange({ partsOfDay })}
      />
      {choices.sites.length > 1 && (
        <Wish
          label="Sites"
          options={choices.sites.map(({ id, name }) => ({ value: id, label: name }))}
          value={form.siteIds}
          onChange={(siteIds) => onChange({ siteIds })}
        />
      )}
      <Select
        id="waiting-therapistIds"
        label="Therapist"
        placeholder="Anyone"
        value={form.therapistId}
        onChange={(event) => onChange({ therapistId: event.target.value })}
        options={therapists.map(({ id, name }) => ({ value: id, label: name }))}
        error={errorOf("waiting-therapistIds")}
      />
      <FieldRow>
        <DateEntry
          id="waiting-latestOn"
          label="No later than"
          today={today}
          value={form.latestText}
          onChange={(latestText, latestOn) => onChange({ latestText, latestOn })}
          error={errorOf("waiting-latestOn")}
        />
        <TextInput
          id="waiting-noticeHours"
          label="Hours of notice"
          hint="That they need to get here"
          inputMode="numeric"
          span="short"
          value={form.noticeText}
          onChange={(event) => onChange({ noticeText: event.target.value })}
          error={errorOf("waiting-noticeHours")}
        />
      </FieldRow>
      <InsteadOf
        patientId={patientId}
        value={form.insteadOfId}
        onChange={(insteadOfId) => onChange({ insteadOfId })}
        error={errorOf("waiting-insteadOfId")}
      />
      <TextInput
        id="waiting-deskNote"
        label="Note"
        hint="For the front desk, not clinical. May be left empty"
        value={form.deskNote}
        onChange={(event) => onChange({ deskNote: event.target.value })}
        error={errorOf("waiting-deskNote")}
      />
    </>
  );
}

interface WishProps {
  label: string;
  options: readonly { value: string; label: string; fullLabel?: string }[];
  value: readonly string[];
  onChange: (value: string[]) => void;
}

function Wish({ label, ...rest }: WishProps) {
  return (
    <div className="field">
      <span className="label">{label}</span>
      <ManyChoice label={label} {...rest} />
    </div>
  );
}

interface InsteadOfProps {
  patientId: string | null;
  value: string;
  onChange: (id: string) => void;
  error: string | undefined;
}

function InsteadOf({ patientId, value, onChange, error }: InsteadOfProps) {
  const visits = useVisitsAhead(patientId).data ?? [];
  if (visits.length === 0) return null;
  return (
    <Select
      id="waiting-insteadOfId"
      label="Instead of"
      hint="That visit is given up when they accept another time"
      placeholder="None: this is one more visit"
      value={value}
      onChange={(event) => onChange(event.target.value)}
      options={visits.map((visit) => ({
        value: visit.id,
        label: `${weekdayDate(visit.day)}, ${visit.startTime}, ${visit.serviceName} with ${visit.therapistName}`,
      }))}
      error={error}
    />
  );
}
