"use client";
import { type ElementType, type ReactNode, useId } from "react";

export interface ChoiceOption {
  value: string;
  label: ReactNode;
  /** Read instead of a short label such as "Mon". */
  fullLabel?: string;
}

interface Shared {
  /** Names the group for readers; show a label of your own above where one is needed. */
  label: string;
  options: readonly ChoiceOption[];
}

/** One of a few, all in sight: radio buttons that look like one ruled box. */
export function Choice({
  label,
  options,
  value,
  onChange,
}: Shared & { value: string; onChange: (value: string) => void }) {
  const name = useId();
  return (
    <div className="choice" role="radiogroup" aria-label={label}>
      {options.map((option) => (
        <label key={option.value}>
          <input
            type="radio"
            name={name}
            value={option.value}
            checked={option.value === value}
            onChange={() => onChange(option.value)}
            aria-label={option.fullLabel}
          />
          {option.label}
        </label>
      ))}
    </div>
  );
}

/** Any number of a few: tick boxes that look like one ruled box. */
export function ManyChoice(
  props: Shared & { value: readonly string[]; onChange: (value: string[]) => void },
) {
  const { label, options, value, onChange } = props;
  const toggle = (one: string) =>
    onChange(value.includes(one) ? value.filter((v) => v !== one) : [...value, one]);
  return (
    // biome-ignore lint/a11y/useSemanticElements: a fieldset cannot be laid out as a row in every browser
    <div className="choice" role="group" aria-label={label}>
      {options.map((option) => (
        <label key={option.value}>
          <input
            type="checkbox"
            checked={value.includes(option.value)}
            onChange={() => toggle(option.value)}
            aria-label={option.fullLabel}
          />
          {option.label}
        </label>
      ))}
    </div>
  );
}

export interface ChoiceLink {
  href: string;
  label: ReactNode;
  current?: boolean;
}

/** The same box for views that are pages of their own. */
export function ChoiceLinks({
  label,
  items,
  as: Link = "a",
}: {
  label: string;
  items: readonly ChoiceLink[];
  as?: ElementType;
}) {
  return (
    <nav className="choice" aria-label={label}>
      {items.map((item) => (
        <Link key={item.href} href={item.href} aria-current={item.current ? "true" : undefined}>
          {item.label}
        </Link>
      ))}
    </nav>
  );
}
