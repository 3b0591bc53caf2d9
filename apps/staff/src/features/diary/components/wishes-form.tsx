"use client";
import type { BookingChoicesView, FoundTimesView } from "@withy/contracts/diary";
import { shortDate } from "@withy/core/date-words";
import type { RankConcern } from "@withy/diary/rank-time";
import { Button } from "@withy/ui/button";
import { ManyChoice } from "@withy/ui/choice";
import { Combobox, type ComboboxOption } from "@withy/ui/combobox";
import { DateEntry } from "@withy/ui/date-entry";
import { Glyph } from "@withy/ui/glyph";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { findPatients } from "@/api/find-patients";
import { orderOf, promoted, type Wishes } from "../find-wishes";
import { readTime } from "../minute-words";
import { MoreWishes } from "./more-wishes";

export interface WishesFormProps {
  choices: BookingChoicesView;
  wishes: Wishes;
  onChange: (part: Partial<Wishes>) => void;
  patient: ComboboxOption | null;
  onPatient: (patient: ComboboxOption | null) => void;
  seenBy: FoundTimesView["seenBy"];
  today: string;
}

const weekdays = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday"].map((fullLabel, i) => ({
  value: String(i + 1),
  label: fullLabel.slice(0, 3),
  fullLabel,
}));

const concernWords: Record<RankConcern, string> = {
  wish: "The wishes",
  wait: "The wait",
  knows: "The same therapist",
  day: "A day without odd gaps",
};

const badTime = (text: string) => text.trim() !== "" && readTime(text) === null;

/** What the caller asks for. Every change looks again at once. */
export function WishesForm({
  choices,
  wishes,
  onChange,
  patient,
  onPatient,
  seenBy,
  today,
}: WishesFormProps) {
  const service = choices.services.find((one) => one.id === wishes.serviceId);
  const therapists = choices.therapists.filter((t) => !service || service.therapistIds.includes(t.id));
  const seen = (id: string) => seenBy.find((one) => one.therapistId === id);
  return (
    <form className="wishes" aria-label="Wishes" onSubmit={(event) => event.preventDefault()}>
      <Combobox
        id="find-patient"
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
      />
      <Select
        id="find-service"
        label="For"
        placeholder="Choose what the visit is for"
        value={wishes.serviceId}
        onChange={(event) => onChange({ serviceId: event.target.value })}
        options={choices.services.map((s) => ({
          value: s.id,
          label: `${s.name}, ${s.durationMinutes} minutes`,
        }))}
      />
      <div className="field">
        <span className="label">Days</span>
        <ManyChoice
          label="Days"
          options={weekdays}
          value={wishes.weekdays}
          onChange={(days) => onChange({ weekdays: days })}
        />
      </div>
      <div className="wishtimes">
        <TextInput
          id="find-from"
          label="From"
          placeholder="any"
          value={wishes.fromText}
          onChange={(event) => onChange({ fromText: event.target.value })}
          error={badTime(wishes.fromText) ? "Enter a time, such as 9:30" : undefined}
        />
        <TextInput
          id="find-until"
          label="Until"
          placeholder="any"
          value={wishes.untilText}
          onChange={(event) => onChange({ untilText: event.target.value })}
          error={badTime(wishes.untilText) ? "Enter a time, such as 11" : undefined}
        />
        <DateEntry
          id="find-earliest"
          label="Not before"
          today={today}
          value={wishes.earliestText}
          onChange={(earliestText, earliestOn) => onChange({ earliestText, earliestOn })}
        />
      </div>
      <Select
        id="find-therapist"
        label="Therapist"
        placeholder="Anyone"
        value={wishes.therapistId}
        onChange={(event) => onChange({ therapistId: event.target.value })}
        options={therapists.map((t) => ({
          value: t.id,
          label: seen(t.id) ? `${t.name}, ${seen(t.id)?.visits} visits` : t.name,
        }))}
        after={
          seenBy[0] &&
          `Last seen by ${seenBy[0].name} on ${shortDate(seenBy[0].lastOn, today)}, ${seenBy[0].visits} ${seenBy[0].visits === 1 ? "visit" : "visits"}`
        }
      />
      {choices.sites.length > 1 && (
        <div className="field">
          <span className="label">Site</span>
          <ManyChoice
            label="Sites"
            options={choices.sites.map((s) => ({ value: s.id, label: s.name }))}
            value={wishes.siteIds}
            onChange={(siteIds) => onChange({ siteIds })}
          />
        </div>
      )}
      <MoreWishes wishes={wishes} onChange={onChange} today={today} />
      <Order
        order={wishes.order.length > 0 ? wishes.order : orderOf(choices.weights)}
        onChange={(order) => onChange({ order })}
      />
    </form>
  );
}

function Order({
  order,
  onChange,
}: {
  order: readonly RankConcern[];
  onChange: (order: RankConcern[]) => void;
}) {
  return (
    <div className="field">
      <span className="label" id="find-order">
        What counts, in this order
      </span>
      <ol className="wishorder" aria-labelledby="find-order">
        {order.map((concern, i) => (
          <li key={concern}>
            <span className="num soft">{i + 1}</span>
            <span className="grow">{concernWords[concern]}</span>
            {i > 0 && (
              <Button
                kind="plain"
                size="small"
                aria-label={`${concernWords[concern]}: one place earlier`}
                onClick={() => onChange(promoted(order, concern))}
              >
                <Glyph name="up" />
              </Button>
            )}
          </li>
        ))}
      </ol>
    </div>
  );
}
