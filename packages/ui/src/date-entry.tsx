"use client";
import { longDate, readDate } from "@withy/core/date-words";
import type { ReactNode } from "react";
import { describedBy, Field } from "./field";

export interface DateEntryProps {
  id: string;
  label: ReactNode;
  name?: string;
  /** What stands in the field: kept as typed, whatever it means. */
  value: string;
  /** The text as typed, and the plain date that it means or null. */
  onChange: (text: string, date: string | null) => void;
  /** The site's day, as an ISO date. Relative words start from it. */
  today: string;
  /** Dates of birth: an absent or two-digit year means the latest one not after today. */
  past?: boolean;
  hint?: ReactNode;
  error?: string | undefined;
  autoFocus?: boolean;
  /** The field is left: the moment to say what is wrong with it. */
  onBlur?: () => void;
}

/** A date as people say it: "27 3 1958", "6 May", "tomorrow", "next thu". Says below what it understood. */
export function DateEntry(props: DateEntryProps) {
  const { id, label, value, onChange, today, past = false, hint, error } = props;
  const read = (text: string) => (text.trim() === "" ? null : readDate(text, today, { past }));
  const understood = read(value);
  return (
    <Field
      label={label}
      htmlFor={id}
      hint={hint}
      error={error}
      after={
        <output id={`${id}-understood`} htmlFor={id}>
          {understood
            ? longDate(understood)
            : value.trim() === ""
              ? ""
              : "Not a date yet. Type day, month and year, or a word such as tomorrow"}
        </output>
      }
    >
      <input
        id={id}
        name={props.name}
        className="input"
        type="text"
        inputMode="text"
        autoComplete="off"
        // biome-ignore lint/a11y/noAutofocus: the caller opens a dialog whose first question this is
        autoFocus={props.autoFocus}
        value={value}
        onChange={(event) => onChange(event.target.value, read(event.target.value))}
        onBlur={props.onBlur}
        aria-invalid={error ? true : undefined}
        aria-describedby={[describedBy(id, { hint, error }), `${id}-understood`].filter(Boolean).join(" ")}
      />
    </Field>
  );
}
