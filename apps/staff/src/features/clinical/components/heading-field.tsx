"use client";
import type { Heading } from "@withy/clinical/notes/headings";
import { type ReactNode, useLayoutEffect, useRef } from "react";

export interface HeadingFieldProps {
  heading: Heading;
  value: string;
  onChange: (text: string) => void;
  error?: string | undefined;
  /** At most one thing to do, at the right end of the heading's line. */
  action?: ReactNode;
  children?: ReactNode;
}

const line = 28;

/** One heading and its lines. The field grows by whole lines, so that the writing stays on the rules. */
export function HeadingField({ heading, value, onChange, error, action, children }: HeadingFieldProps) {
  const field = useRef<HTMLTextAreaElement>(null);
  const id = `heading-${heading.key}`;
  useLayoutEffect(() => {
    const area = field.current;
    // Browsers that size a field by its content do so in the style sheet, also when the window changes.
    if (!area || CSS.supports("field-sizing", "content")) return;
    area.style.height = `${line}px`;
    area.style.height = `${Math.max(1, Math.round(area.scrollHeight / line)) * line}px`;
  }, [value]);
  const isEmpty = value.trim() === "";
  return (
    <section className="heading-field" data-bad={error ? "" : undefined}>
      <div className="heading-line">
        <label htmlFor={id}>
          {heading.label}
          {heading.isRequired && isEmpty && <span className="needed"> needed</span>}
        </label>
        {error && (
          <span className="err" id={`${id}-error`}>
            {error}
          </span>
        )}
        <span className="grow" />
        {isEmpty && heading.ready !== undefined && (
          <button type="button" className="linklike" onClick={() => onChange(heading.ready ?? "")}>
            Write the usual sentence
          </button>
        )}
        {action}
      </div>
      {children}
      <textarea
        ref={field}
        id={id}
        rows={1}
        value={value}
        placeholder={heading.prompt}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-error` : undefined}
        onChange={(event) => onChange(event.target.value)}
      />
    </section>
  );
}
