"use client";
import { type MouseEvent, useEffect, useRef } from "react";

export interface FieldError {
  /** Id of the control that it is about; without it the sentence is about the whole form. */
  id?: string | undefined;
  /** The same words as beside the field. */
  message: string;
}

export interface ErrorSummaryProps {
  errors: readonly FieldError[];
  title?: string;
  /** Changes with every attempt, so that the summary takes the focus again after a second refusal. */
  attempt?: number | string;
}

function goTo(event: MouseEvent<HTMLAnchorElement>, id: string) {
  const target = document.getElementById(id);
  if (!target) return;
  event.preventDefault();
  target.focus();
  // The label must be in sight as well as the control.
  (target.closest(".field") ?? target).scrollIntoView?.({ block: "nearest" });
}

/** Stands at the top of a form after a refused submit, takes the focus and links to each field. */
export function ErrorSummary({ errors, title = "There is a problem", attempt = 0 }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const has = errors.length > 0;
  useEffect(() => {
    if (has) box.current?.focus();
  }, [has, attempt]);
  if (!has) return null;
  return (
    <div className="summary" role="alert" tabIndex={-1} ref={box} aria-labelledby="error-summary-title">
      <h2 id="error-summary-title" className="text-ui font-ui font-semibold">
        {title}
      </h2>
      <ul>
        {errors.map((error) => (
          <li key={`${error.id ?? ""}${error.message}`}>
            {error.id === undefined ? (
              <span className="danger">{error.message}</span>
            ) : (
              <a href={`#${error.id}`} onClick={(event) => goTo(event, error.id ?? "")}>
                {error.message}
              </a>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
