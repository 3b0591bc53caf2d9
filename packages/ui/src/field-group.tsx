import type { ReactNode } from "react";
import { describedBy } from "./field";

export interface FieldGroupProps {
  legend: ReactNode;
  /** Where an error summary's link leads; the first control inside should carry it when there is an error. */
  id: string;
  hint?: ReactNode;
  error?: string | undefined;
  children: ReactNode;
}

/** Several controls that answer one question: radio buttons, tick boxes, the parts of an address. */
export function FieldGroup({ legend, id, hint, error, children }: FieldGroupProps) {
  return (
    <fieldset
      className="field"
      data-bad={error ? "" : undefined}
      aria-describedby={describedBy(id, { hint, error })}
    >
      <legend>{legend}</legend>
      {hint && (
        <p className="hint" id={`${id}-hint`}>
          {hint}
        </p>
      )}
      {error && (
        <p className="err" id={`${id}-error`}>
          <span className="vh">Error: </span>
          {error}
        </p>
      )}
      {children}
    </fieldset>
  );
}

/** Short fields side by side where there is room. */
export function FieldRow({ children }: { children: ReactNode }) {
  return <div className="fields">{children}</div>;
}
