"use client";
import { DateEntry } from "@withy/ui/date-entry";
import { useState } from "react";

interface Typed {
  readonly text: string;
  /** What the text means, or null. */
  readonly day: string | null;
}
type Which = "from" | "until";
type Days = Readonly<Record<Which, Typed>>;

const blank: Typed = { text: "", day: null };

interface Props {
  today: string;
  /** Told of days that can be asked for; an empty text is no limit. */
  onChange: (days: { from: string; until: string }) => void;
}

/** The first and the last day to look at. What cannot be meant is told when the field is left, and asks for nothing. */
export function AuditDays({ today, onChange }: Props) {
  const [days, setDays] = useState<Days>({ from: blank, until: blank });
  const [told, setTold] = useState<readonly Which[]>([]);
  const take = (which: Which) => (text: string, day: string | null) => {
    const now = { ...days, [which]: { text, day } };
    setDays(now);
    setTold([]);
    if (wrongWith(now, "from") === null && wrongWith(now, "until") === null)
      onChange({ from: now.from.day ?? "", until: now.until.day ?? "" });
  };
  const entry = (which: Which) => ({
    id: which,
    today,
    value: days[which].text,
    onChange: take(which),
    onBlur: () => setTold((before) => [...before.filter((one) => one !== which), which]),
    error: told.includes(which) ? (wrongWith(days, which) ?? undefined) : undefined,
  });
  return (
    <>
      <DateEntry label="From" {...entry("from")} />
      <DateEntry label="Until" {...entry("until")} />
    </>
  );
}

function wrongWith({ from, until }: Days, which: Which): string | null {
  const { text, day } = which === "from" ? from : until;
  if (text.trim() === "") return null;
  if (day === null) return "Enter a day such as 6 May, 6 5 2026 or yesterday";
  if (which === "until" && from.day !== null && day < from.day)
    return "Enter a day that is not before the first one";
  return null;
}
