"use client";
import type { BookingChoicesView } from "@withy/contracts/diary";
import { DateEntry } from "@withy/ui/date-entry";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import type { WantedTime } from "../wanted-time";

export interface TimeFieldsProps {
  prefix: string;
  choices: BookingChoicesView;
  serviceId: string;
  wanted: WantedTime;
  onChange: (part: Partial<WantedTime>) => void;
  today: string;
  errorOf: (id: string) => string | undefined;
}

/** Day, time, therapist, site and room: the same for booking and for moving. */
export function TimeFields({
  prefix,
  choices,
  serviceId,
  wanted,
  onChange,
  today,
  errorOf,
}: TimeFieldsProps) {
  const service = choices.services.find((s) => s.id === serviceId);
  const sites = choices.sites;
  const therapists = choices.therapists.filter(
    (t) =>
      (!wanted.siteId || t.siteIds.includes(wanted.siteId)) &&
      (!service || service.therapistIds.includes(t.id)),
  );
  const rooms = choices.rooms.filter(
    (r) => r.siteId === wanted.siteId && (!service || r.kind === service.roomKind),
  );
  const id = (name: string) => `${prefix}-${name}`;
  return (
    <>
      <FieldRow>
        <DateEntry
          id={id("day")}
          label="Day"
          value={wanted.dayText}
          today={today}
          onChange={(dayText, day) => onChange({ dayText, day })}
          error={errorOf(id("day"))}
        />
        <TextInput
          id={id("time")}
          label="At"
          value={wanted.timeText}
          onChange={(event) => onChange({ timeText: event.target.value })}
          error={errorOf(id("time"))}
        />
      </FieldRow>
      <FieldRow>
        <Select
          id={id("therapistId")}
          label="With"
          placeholder="Choose a therapist"
          value={wanted.therapistId}
          onChange={(event) => onChange({ therapistId: event.target.value })}
          options={therapists.map((t) => ({ value: t.id, label: t.name }))}
          error={errorOf(id("therapistId"))}
        />
        <Select
          id={id("siteId")}
          label="Site"
          placeholder="Choose a site"
          value={wanted.siteId}
          onChange={(event) => onChange({ siteId: event.target.value, roomId: "" })}
          options={sites.map((s) => ({ value: s.id, label: s.name }))}
          error={errorOf(id("siteId"))}
        />
        <Select
          id={id("roomId")}
          label="Room"
          placeholder="Any free room"
          value={wanted.roomId}
          onChange={(event) => onChange({ roomId: event.target.value })}
          options={rooms.map((r) => ({ value: r.id, label: r.name }))}
          error={errorOf(id("roomId"))}
        />
      </FieldRow>
    </>
  );
}
