import type { ComponentProps, ReactNode } from "react";
import { classNames } from "./class-names";
import { describedBy, Field } from "./field";

interface Labelled {
  id: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  after?: ReactNode;
}

export type TextInputProps = Labelled &
  ComponentProps<"input"> & { size?: never; span?: "short" | "mid" | "full" };

/** One line of text with its label, hint and error. Spread a form library's `register(...)` onto it. */
export function TextInput({
  id,
  label,
  hint,
  error,
  after,
  span = "full",
  className,
  ...rest
}: TextInputProps) {
  return (
    <Field label={label} htmlFor={id} hint={hint} error={error} after={after}>
      <input
        type="text"
        autoComplete="off"
        {...rest}
        id={id}
        className={classNames("input", className)}
        data-width={span}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, { hint, error })}
      />
    </Field>
  );
}

export type TextAreaProps = Labelled &
  ComponentProps<"textarea"> & { /** Written on ruled lines in the note's type. */ ruled?: boolean };

export function TextArea({
  id,
  label,
  hint,
  error,
  after,
  ruled = false,
  className,
  ...rest
}: TextAreaProps) {
  return (
    <Field label={label} htmlFor={id} hint={hint} error={error} after={after}>
      <textarea
        rows={3}
        {...rest}
        id={id}
        className={classNames("input", className)}
        data-ruled={ruled ? "" : undefined}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, { hint, error })}
      />
    </Field>
  );
}
