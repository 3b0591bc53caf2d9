"use client";
import { Combobox as Base } from "@base-ui/react/combobox";
import { type ReactNode, useEffect, useRef, useState } from "react";
import { describedBy, Field } from "./field";
import { Glyph } from "./glyph";

export interface ComboboxOption {
  id: string;
  label: string;
  /** Second line: what tells two of the same name apart. */
  detail?: string;
}

export interface ComboboxProps<Option extends ComboboxOption> {
  id: string;
  label: ReactNode;
  value: Option | null;
  onChange: (option: Option | null) => void;
  /** Asks the server; must honour the signal, since a newer keystroke cancels an older question. */
  search: (text: string, signal: AbortSignal) => Promise<readonly Option[]>;
  /** Letters before the server is asked. */
  from?: number;
  hint?: ReactNode;
  error?: string | undefined;
  after?: ReactNode;
  placeholder?: string;
  autoFocus?: boolean;
}

type Answer<Option> = { state: "idle" | "asking" | "failed" | "answered"; options: readonly Option[] };

const pauseMs = 150;

function useServerSearch<Option>(search: ComboboxProps<Option & ComboboxOption>["search"], from: number) {
  const [answer, setAnswer] = useState<Answer<Option>>({ state: "idle", options: [] });
  const running = useRef<AbortController | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const stop = () => {
    clearTimeout(timer.current);
    running.current?.abort();
  };
  useEffect(() => stop, []);
  const ask = (text: string) => {
    stop();
    if (text.trim().length < from) return setAnswer({ state: "idle", options: [] });
    const controller = new AbortController();
    running.current = controller;
    setAnswer((before) => ({ state: "asking", options: before.options }));
    timer.current = setTimeout(() => {
      search(text.trim(), controller.signal).then(
        (options) => !controller.signal.aborted && setAnswer({ state: "answered", options }),
        () => !controller.signal.aborted && setAnswer({ state: "failed", options: [] }),
      );
    }, pauseMs);
  };
  return { answer, ask };
}

function says<Option>(answer: Answer<Option>, from: number): string {
  if (answer.state === "asking") return "Looking";
  if (answer.state === "failed") return "The search did not answer. Check the connection and type again.";
  if (answer.state === "answered" && answer.options.length === 0)
    return "No match. Try fewer letters or another spelling.";
  return answer.state === "idle" ? `Type ${from} letters or more` : "";
}

/** Finds one of many by typing; arrows move, Enter takes, Escape closes. */
export function Combobox<Option extends ComboboxOption>(props: ComboboxProps<Option>) {
  const { id, label, value, onChange, search, from = 2, hint, error, after } = props;
  const { answer, ask } = useServerSearch<Option>(search, from);
  const items =
    value && !answer.options.some((o) => o.id === value.id)
      ? [...answer.options, value]
      : [...answer.options];
  const said = says(answer, from);
  return (
    <Field label={label} htmlFor={id} hint={hint} error={error} after={after}>
      <Base.Root
        items={items}
        value={value}
        onValueChange={onChange}
        itemToStringLabel={(option: Option) => option.label}
        isItemEqualToValue={(a: Option, b: Option) => a.id === b.id}
        filter={null}
        autoHighlight
        onInputValueChange={(text, { reason }) => reason !== "item-press" && ask(text)}
      >
        <Base.InputGroup className="input shell">
          <Base.Input
            id={id}
            placeholder={props.placeholder}
            autoFocus={props.autoFocus}
            aria-invalid={error ? true : undefined}
            aria-describedby={describedBy(id, { hint, error })}
          />
          <Base.Clear aria-label="Clear">
            <Glyph name="cross" />
          </Base.Clear>
        </Base.InputGroup>
        <Base.Portal>
          <Base.Positioner sideOffset={4} className="z-40">
            <Base.Popup className="popup" aria-busy={answer.state === "asking" || undefined}>
              <Base.Status>{said && <div className="says">{said}</div>}</Base.Status>
              <Base.List>
                {(option: Option) => (
                  <Base.Item key={option.id} value={option} className="option">
                    {option.label}
                    {option.detail && <span className="small">{option.detail}</span>}
                  </Base.Item>
                )}
              </Base.List>
            </Base.Popup>
          </Base.Positioner>
        </Base.Portal>
      </Base.Root>
    </Field>
  );
}
