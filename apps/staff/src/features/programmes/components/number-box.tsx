"use client";
import { useEffect, useState } from "react";

/**
 * A number that stands inside a line of words. What is typed stays as typed; every whole number is passed on, and
 * the programme's own rule says whether it is within limits.
 */
export function NumberBox({
  label,
  value,
  onChange,
  className = "number-box",
  disabled = false,
  isWrong = false,
}: {
  label: string;
  /** Null where the lines differ. */
  value: number | null;
  onChange: (value: number) => void;
  className?: string;
  disabled?: boolean;
  isWrong?: boolean;
}) {
  const given = value === null ? "" : String(value);
  const [text, setText] = useState(given);
  useEffect(() => setText(given), [given]);
  const isWhole = /^\d{1,5}$/.test(text);
  return (
    <input
      className={className}
      type="text"
      inputMode="numeric"
      autoComplete="off"
      size={Math.max(1, text.length)}
      aria-label={label}
      aria-invalid={isWrong || (!isWhole && text !== "" && text !== given) || undefined}
      placeholder={value === null ? "…" : undefined}
      value={text}
      disabled={disabled}
      onFocus={(event) => event.currentTarget.select()}
      onChange={(event) => {
        const typed = event.currentTarget.value.trim();
        setText(typed);
        if (/^\d{1,5}$/.test(typed)) onChange(Number(typed));
      }}
      onBlur={() => !isWhole && setText(given)}
    />
  );
}
