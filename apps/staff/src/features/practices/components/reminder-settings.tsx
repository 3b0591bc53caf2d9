"use client";
import type { DiarySettingsView } from "@withy/contracts/diary";
import { Button, Buttons } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { ErrorSummary } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { useChanges } from "@withy/ui/recent-changes";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { ApiError } from "@/api/request";
import { useAwake } from "@/components/use-awake";
import { useChangeDiarySettings } from "../hooks/use-diary-settings";
import { momentWords } from "../moment-words";
import { readReminderHours, reminderHoursWords } from "../reminder-hours";

/** What another owner saved meanwhile, from a save that came too late. */
function theirsOf(error: unknown): DiarySettingsView | null {
  if (!(error instanceof ApiError) || error.problem.code !== "stale") return null;
  return (error.problem.more.current as DiarySettingsView | undefined) ?? null;
}

const theirsWords = ({ reminderHours, hasNamesInFeed }: DiarySettingsView): string =>
  [
    reminderHours.length === 0 ? "no reminders" : `reminders at ${reminderHoursWords(reminderHours)} hours`,
    hasNamesInFeed ? "names in feeds" : "initials in feeds",
  ].join(", ");

/** When reminders go out, and whether calendar feeds may carry names. */
export function ReminderSettings({ first, zone }: { first: DiarySettingsView; zone: string }) {
  const { announce } = useChanges();
  const [version, setVersion] = useState(first.version);
  const change = useChangeDiarySettings();
  const isAwake = useAwake();
  const { register, handleSubmit } = useForm({
    defaultValues: {
      reminderHours: reminderHoursWords(first.reminderHours),
      hasNamesInFeed: first.hasNamesInFeed,
    },
  });
  const theirs = theirsOf(change.error);
  const save = handleSubmit(({ reminderHours, hasNamesInFeed }) =>
    change.mutate(
      {
        reminderHours: readReminderHours(reminderHours),
        hasNamesInFeed,
        version: theirs?.version ?? version,
      },
      {
        onSuccess: (saved) => {
          setVersion(saved.version);
          const at = momentWords(new Date().toISOString(), zone).slice(-5);
          announce({ at, said: "You changed reminders and calendar feeds" });
        },
      },
    ),
  );
  return (
    <section aria-labelledby="reminders-title">
      <SectionHead id="reminders-title" title="Reminders and calendar feeds" />
      <form noValidate className="narrowform" onSubmit={save}>
        {change.error && (
          <ErrorSummary
            title="The settings are not saved yet"
            errors={problemItems(change.error, (field) => field.split(".")[0] ?? field)}
            attempt={change.submittedAt}
          />
        )}
        {theirs && (
          <p className="note">
            Saved meanwhile: {theirsWords(theirs)}. Save again to put yours in their place.
          </p>
        )}
        <TextInput
          id="reminderHours"
          label="Hours before a visit"
          hint="Up to four whole hours from 1 to 336, such as 48, 24. Leave it empty to send none. Reminders go by e-mail to patients who prefer e-mail and have not withdrawn their consent."
          inputMode="text"
          span="mid"
          error={fieldProblem(change.error, "reminderHours")}
          {...register("reminderHours")}
        />
        <FieldGroup
          id="hasNamesInFeed"
          legend="Calendar feeds"
          hint="A feed shows the patient's initials, the site and the room. It names no service, since some services tell why a person comes. Whoever holds a feed's address can read it."
        >
          <Check {...register("hasNamesInFeed")}>Show patients' full names instead of initials</Check>
        </FieldGroup>
        <Buttons>
          <Button kind="primary" type="submit" disabled={!isAwake} busy={change.isPending}>
            Save reminders and feeds
          </Button>
        </Buttons>
      </form>
    </section>
  );
}
