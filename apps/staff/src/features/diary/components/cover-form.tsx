"use client";
import { useMutation } from "@tanstack/react-query";
import type { BookingChoicesView, CoverPlanView } from "@withy/contracts/diary";
import { shortDate } from "@withy/core/date-words";
import { Button } from "@withy/ui/button";
import { Choice } from "@withy/ui/choice";
import { DateEntry } from "@withy/ui/date-entry";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { type PlanCover, planCover } from "../cover-api";
import { readTime } from "../minute-words";

interface CoverFormProps {
  choices: BookingChoicesView;
  today: string;
  onPlanned: (plan: CoverPlanView) => void;
}

interface Typed {
  kind: string;
  causeId: string;
  fromText: string;
  fromDay: string | null;
  fromTime: string;
  untilText: string;
  untilDay: string | null;
  untilTime: string;
  reason: string;
}

/** The server's field names and the fields on this page. */
const fieldIds: Readonly<Record<string, string>> = {
  therapistId: "cover-cause",
  roomId: "cover-cause",
  startsAt: "cover-fromDay",
  endsAt: "cover-untilDay",
  reason: "cover-reason",
};

function missingIn(typed: Typed): FieldError[] {
  const errors: FieldError[] = [];
  const say = (isMissing: boolean, id: string, message: string) => isMissing && errors.push({ id, message });
  say(!typed.causeId, "cover-cause", typed.kind === "room" ? "Choose a room" : "Choose a therapist");
  say(!typed.fromDay, "cover-fromDay", "Enter the first day, such as today or 8 Dec");
  say(!readTime(typed.fromTime), "cover-fromTime", "Enter a time, such as 8:00");
  say(!typed.untilDay, "cover-untilDay", "Enter the last day, such as today or 8 Dec");
  say(!readTime(typed.untilTime), "cover-untilTime", "Enter a time, such as 20:00");
  say(typed.reason.trim() === "", "cover-reason", "Say why, in a few words");
  return errors;
}

const inputOf = (typed: Typed): PlanCover => ({
  ...(typed.kind === "room" ? { roomId: typed.causeId } : { therapistId: typed.causeId }),
  startsAt: `${typed.fromDay}T${readTime(typed.fromTime)}`,
  endsAt: `${typed.untilDay}T${readTime(typed.untilTime)}`,
  reason: typed.reason,
});

function useCoverForm({ today, onPlanned }: CoverFormProps) {
  const day = shortDate(today);
  const [typed, setTyped] = useState<Typed>({
    ...{ kind: "therapist", causeId: "", reason: "" },
    ...{ fromText: day, fromDay: today, fromTime: "8:00" },
    ...{ untilText: day, untilDay: today, untilTime: "20:00" },
  });
  const [missing, setMissing] = useState<FieldError[]>([]);
  const [attempt, setAttempt] = useState(0);
  const plan = useMutation({
    mutationFn: (input: PlanCover) => planCover(input, crypto.randomUUID()),
    onSuccess: onPlanned,
  });
  const refused = plan.error ? problemItems(plan.error, (field) => fieldIds[field] ?? field) : [];
  const errors: FieldError[] = missing.length > 0 ? missing : refused;
  return {
    typed,
    errors,
    attempt: `${attempt} ${plan.submittedAt}`,
    isBusy: plan.isPending,
    change: (part: Partial<Typed>) => setTyped((before) => ({ ...before, ...part })),
    errorOf: (id: string) => errors.find((e) => e.id === id)?.message,
    submit: () => {
      const found = missingIn(typed);
      setMissing(found);
      setAttempt((n) => n + 1);
      if (found.length === 0) plan.mutate(inputOf(typed));
    },
  };
}

/** Who or which room, from when until when, and why. */
export function CoverForm(props: CoverFormProps) {
  const { choices, today } = props;
  const { typed, errors, attempt, isBusy, change, errorOf, submit } = useCoverForm(props);
  const isAwake = useAwake();
  const siteName = (id: string) => choices.sites.find((s) => s.id === id)?.name ?? "";
  const isRoom = typed.kind === "room";
  const options = isRoom
    ? choices.rooms.map((r) => ({ value: r.id, label: `${r.name}, ${siteName(r.siteId)}` }))
    : choices.therapists.filter((t) => t.siteIds.length > 0).map((t) => ({ value: t.id, label: t.name }));
  return (
    <form
      className="coverform"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <ErrorSummary errors={errors} attempt={attempt} />
      <Choice
        label="What falls out"
        value={typed.kind}
        onChange={(kind) => change({ kind, causeId: "" })}
        options={[
          { value: "therapist", label: "A therapist is away" },
          { value: "room", label: "A room is shut" },
        ]}
      />
      <Select
        id="cover-cause"
        label={isRoom ? "Room" : "Therapist"}
        placeholder={isRoom ? "Choose a room" : "Choose a therapist"}
        value={typed.causeId}
        onChange={(event) => change({ causeId: event.target.value })}
        options={options}
        error={errorOf("cover-cause")}
      />
      <FieldRow>
        <DateEntry
          id="cover-fromDay"
          label="From"
          value={typed.fromText}
          today={today}
          onChange={(fromText, fromDay) => change({ fromText, fromDay })}
          error={errorOf("cover-fromDay")}
        />
        <TextInput
          id="cover-fromTime"
          label="From the time"
          span="short"
          value={typed.fromTime}
          onChange={(event) => change({ fromTime: event.target.value })}
          error={errorOf("cover-fromTime")}
        />
      </FieldRow>
      <FieldRow>
        <DateEntry
          id="cover-untilDay"
          label="Until"
          value={typed.untilText}
          today={today}
          onChange={(untilText, untilDay) => change({ untilText, untilDay })}
          error={errorOf("cover-untilDay")}
        />
        <TextInput
          id="cover-untilTime"
          label="Until the time"
          span="short"
          value={typed.untilTime}
          onChange={(event) => change({ untilTime: event.target.value })}
          error={errorOf("cover-untilTime")}
        />
      </FieldRow>
      <TextInput
        id="cover-reason"
        label="Why"
        hint="Stands in the diary over the time away. Nothing clinical"
        value={typed.reason}
        onChange={(event) => change({ reason: event.target.value })}
        error={errorOf("cover-reason")}
      />
      <Button kind="primary" type="submit" busy={isBusy} disabled={!isAwake}>
        Look for other places
      </Button>
    </form>
  );
}
