"use client";
import type { BookingChoicesView } from "@withy/contracts/diary";
import { ManyChoice } from "@withy/ui/choice";
import { Combobox, type ComboboxOption } from "@withy/ui/combobox";
import { DateEntry } from "@withy/ui/date-entry";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { findPatients } from "@/api/find-patients";
import { type CourseWish, everyOptions } from "../course-wish";

export interface CourseFieldsProps {
  choices: BookingChoicesView;
  wish: CourseWish;
  onChange: (part: Partial<CourseWish>) => void;
  patient: ComboboxOption | null;
  onPatient: (patient: ComboboxOption | null) => void;
  today: string;
  errorOf: (id: string) => string | undefined;
}

const weekdays = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday"].map((fullLabel, i) => ({
  value: String(i + 1),
  label: fullLabel.slice(0, 3),
  fullLabel,
}));

/** Whose course, for what, with whom, and how its visits follow each other. */
export function CourseFields(props: CourseFieldsProps) {
  const { choices, wish, onChange, patient, onPatient, errorOf } = props;
  const service = choices.services.find((s) => s.id === wish.serviceId);
  const therapists = choices.therapists.filter(
    (t) =>
      (!service || service.therapistIds.includes(t.id)) && (!wish.siteId || t.siteIds.includes(wish.siteId)),
  );
  return (
    <>
      <Combobox
        id="course-patientId"
        label="Patient"
        hint={
          <>
            Someone new? <Link href="/patients/new">Register them first</Link>
          </>
        }
        value={patient}
        onChange={onPatient}
        search={findPatients}
        after={patient?.detail}
        error={errorOf("course-patientId")}
      />
      <Select
        id="course-serviceId"
        label="For"
        placeholder="Choose what the visits are for"
        value={wish.serviceId}
        onChange={(event) => onChange({ serviceId: event.target.value })}
        options={choices.services.map((s) => ({ value: s.id, label: `${s.name}, ${s.durationMinutes} min` }))}
        error={errorOf("course-serviceId")}
      />
      <FieldRow>
        <Select
          id="course-siteId"
          label="Site"
          placeholder="Choose a site"
          value={wish.siteId}
          onChange={(event) => onChange({ siteId: event.target.value })}
          options={choices.sites.map((s) => ({ value: s.id, label: s.name }))}
          error={errorOf("course-siteId")}
        />
        <Select
          id="course-therapistId"
          label="With"
          placeholder="Choose a therapist"
          value={wish.therapistId}
          onChange={(event) => onChange({ therapistId: event.target.value })}
          options={therapists.map((t) => ({ value: t.id, label: t.name }))}
          error={errorOf("course-therapistId")}
        />
      </FieldRow>
      <Rhythm {...props} />
    </>
  );
}

function Rhythm({ wish, onChange, today, errorOf }: CourseFieldsProps) {
  return (
    <>
      <FieldRow>
        <DateEntry
          id="course-firstDay"
          label="From"
          today={today}
          value={wish.dayText}
          onChange={(dayText, day) => onChange({ dayText, day })}
          error={errorOf("course-firstDay")}
        />
        <TextInput
          id="course-startTime"
          label="At"
          value={wish.timeText}
          onChange={(event) => onChange({ timeText: event.target.value })}
          error={errorOf("course-startTime")}
        />
      </FieldRow>
      <FieldRow>
        <TextInput
          id="course-visits"
          label="Visits"
          inputMode="numeric"
          value={wish.visitsText}
          onChange={(event) => onChange({ visitsText: event.target.value })}
          error={errorOf("course-visits")}
        />
        <Select
          id="course-every"
          label="How often"
          value={wish.every}
          onChange={(event) => onChange({ every: event.target.value })}
          options={everyOptions}
        />
      </FieldRow>
      {wish.every === "other" && (
        <TextInput
          id="course-everyDays"
          label="Days from one visit to the next"
          inputMode="numeric"
          span="short"
          value={wish.everyText}
          onChange={(event) => onChange({ everyText: event.target.value })}
          error={errorOf("course-everyDays")}
        />
      )}
      {wish.every === "weekdays" && (
        <div className="field" id="course-weekdays" tabIndex={-1}>
          <span className="label">Weekdays</span>
          <ManyChoice
            label="Weekdays"
            options={weekdays}
            value={wish.weekdays}
            onChange={(days) => onChange({ weekdays: days })}
          />
          {errorOf("course-weekdays") && <p className="small danger">{errorOf("course-weekdays")}</p>}
        </div>
      )}
    </>
  );
}
