"use client";
import { shortDate } from "@withy/core/date-words";
import { equipment } from "@withy/diary/equipment";
import type { Urgency } from "@withy/diary/rank-time";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Choice } from "@withy/ui/choice";
import { DateEntry } from "@withy/ui/date-entry";
import { FieldGroup } from "@withy/ui/field-group";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import type { Wishes } from "../find-wishes";
import { readTime } from "../minute-words";

interface Props {
  wishes: Wishes;
  onChange: (part: Partial<Wishes>) => void;
  today: string;
}

const urgencyWords: { value: Urgency; label: string }[] = [
  { value: "routine", label: "Routine" },
  { value: "soon", label: "Soon" },
  { value: "urgent", label: "Urgent" },
];

const needWords = [
  { value: "step-free", label: "Reached without a step" },
  ...equipment.map(({ code, word }) => ({ value: code as string, label: `With ${word}` })),
];

/** Wishes that are seldom asked for: how urgent, a last date, exact windows, and what the room must be. */
export function MoreWishes({ wishes, onChange, today }: Props) {
  const toggle = (need: string, isOn: boolean) =>
    onChange({ needs: isOn ? [...wishes.needs, need] : wishes.needs.filter((one) => one !== need) });
  return (
    <>
      <div className="field">
        <span className="label">Urgency</span>
        <Choice
          label="Urgency"
          options={urgencyWords}
          value={wishes.urgency}
          onChange={(urgency) => onChange({ urgency: urgency as Urgency })}
        />
      </div>
      <details className="morewishes" open={wishes.needs.length + wishes.windows.length > 0 || undefined}>
        <summary>Last date, exact windows, the room</summary>
        <DateEntry
          id="find-latest"
          label="Not after"
          today={today}
          value={wishes.latestText}
          onChange={(latestText, latestOn) => onChange({ latestText, latestOn })}
        />
        <Windows windows={wishes.windows} onChange={(windows) => onChange({ windows })} today={today} />
        <FieldGroup id="find-needs" legend="The room">
          {needWords.map(({ value, label }) => (
            <Check
              key={value}
              type="checkbox"
              checked={wishes.needs.includes(value)}
              onChange={(event) => toggle(value, event.target.checked)}
            >
              {label}
            </Check>
          ))}
        </FieldGroup>
      </details>
    </>
  );
}

const windowWords = (text: string, today: string) =>
  `${shortDate(text.slice(0, 10), today)}, ${text.slice(11, 16)} to ${text.slice(17)}`;

/** Exact windows, added one by one: a visit must lie within one of them. */
function Windows({
  windows,
  onChange,
  today,
}: {
  windows: readonly string[];
  onChange: (windows: string[]) => void;
  today: string;
}) {
  const empty = { dayText: "", day: null as string | null, from: "", until: "" };
  const [typed, setTyped] = useState(empty);
  const [problem, setProblem] = useState<string | undefined>();
  const add = () => {
    const [from, until] = [readTime(typed.from), readTime(typed.until)];
    if (!typed.day || !from || !until || from >= until)
      return setProblem("Enter a day and two times, the earlier one first, such as 10 and 12");
    setProblem(undefined);
    setTyped(empty);
    onChange([...windows, `${typed.day}T${from}/${until}`]);
  };
  return (
    <FieldGroup id="find-windows" legend="Only in these windows" error={problem}>
      {windows.map((text) => (
        <p key={text} className="num">
          {windowWords(text, today)}{" "}
          <Button
            kind="plain"
            size="small"
            onClick={() => onChange(windows.filter((one) => one !== text))}
            aria-label={`Leave out ${windowWords(text, today)}`}
          >
            Leave out
          </Button>
        </p>
      ))}
      <div className="wishtimes">
        <DateEntry
          id="find-window-day"
          label="Day"
          today={today}
          value={typed.dayText}
          onChange={(dayText, day) => setTyped({ ...typed, dayText, day })}
        />
        <TextInput
          id="find-window-from"
          label="From"
          value={typed.from}
          onChange={(event) => setTyped({ ...typed, from: event.target.value })}
        />
        <TextInput
          id="find-window-until"
          label="To"
          value={typed.until}
          onChange={(event) => setTyped({ ...typed, until: event.target.value })}
        />
      </div>
      <Button size="small" onClick={add}>
        Add this window
      </Button>
    </FieldGroup>
  );
}
