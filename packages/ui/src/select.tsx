import type { ComponentProps, ReactNode } from "react";
import { classNames } from "./class-names";
import { describedBy, Field } from "./field";
import { Glyph } from "./glyph";

export interface SelectOption {
  value: string;
  label: string;
  disabled?: boolean;
}

export type SelectProps = Omit<ComponentProps<"select">, "children"> & {
  id: string;
  label: ReactNode;
  options: readonly SelectOption[];
  /** First line with an empty value, for example "Choose a site". */
  placeholder?: string;
  hint?: ReactNode;
  error?: string | undefined;
  after?: ReactNode;
};

/** One of a short fixed list. The browser's own control: typing, touch and readers work as everywhere. */
export function Select(props: SelectProps) {
  const { id, label, options, placeholder, hint, error, after, className, ...rest } = props;
  return (
    <Field label={label} htmlFor={id} hint={hint} error={error} after={after}>
      <span className="select">
        <select
          {...rest}
          id={id}
          className={classNames("input", className)}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, { hint, error })}
        >
          {placeholder !== undefined && <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
        <Glyph name="down" />
      </span>
    </Field>
  );
}
