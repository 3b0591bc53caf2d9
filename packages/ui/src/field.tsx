import type { ReactNode } from "react";

export interface FieldProps {
  label: ReactNode;
  /** Id of the control inside; the label, hint and error point at it. */
  htmlFor: string;
  hint?: ReactNode;
  /** The sentence that says what to do, in the label's own words. */
  error?: string | undefined;
  /** Shown below the control: what was understood, what will follow. */
  after?: ReactNode;
  children: ReactNode;
}

/** The ids that a control must name in `aria-describedby`, or nothing. */
export function describedBy(id: string, { hint, error }: { hint?: ReactNode; error?: string | undefined }) {
  const ids = [hint ? `${id}-hint` : "", error ? `${id}-error` : ""].filter(Boolean);
  return ids.length > 0 ? ids.join(" ") : undefined;
}

/** Label above, hint, error, then the control. Give the control `id`, `aria-invalid` and `describedBy(...)`. */
export function Field({ label, htmlFor, hint, error, after, children }: FieldProps) {
  return (
    <div className="field" data-bad={error ? "" : undefined}>
      <label htmlFor={htmlFor}>{label}</label>
      {hint && (
        <p className="hint" id={`${htmlFor}-hint`}>
          {hint}
        </p>
      )}
      {error && (
        <p className="err" id={`${htmlFor}-error`}>
          <span className="vh">Error: </span>
          {error}
        </p>
      )}
      {children}
      {after && <div className="hint after">{after}</div>}
    </div>
  );
}
