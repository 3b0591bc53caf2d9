"use client";
import { type KeyboardEvent, type ReactNode, useEffect, useId, useRef, useState } from "react";
import { describedBy, Field } from "./field";
import { Glyph } from "./glyph";
import { type SearchAnswer, useServerSearch } from "./use-server-search";

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

function says<Option>(answer: SearchAnswer<Option>, from: number): string {
  if (answer.state === "asking") return answer.options.length > 0 ? "" : "Looking";
  if (answer.state === "failed") return "The search did not answer. Check the connection and type again.";
  if (answer.state === "answered" && answer.options.length === 0)
    return "No match. Try fewer letters or another spelling.";
  return answer.state === "idle" ? `Type ${from} letters or more` : "";
}

/** Text, list and cursor of the field. The value changes only when an option is taken or the text is emptied. */
function useCombobox<Option extends ComboboxOption>({
  value,
  onChange,
  search,
  from = 2,
}: ComboboxProps<Option>) {
  const { answer, ask } = useServerSearch<Option>(search, from);
  const [text, setText] = useState(value?.label ?? "");
  const [isOpen, setIsOpen] = useState(false);
  const [active, setActive] = useState(0);
  const shown = useRef(value);
  useEffect(() => {
    if (shown.current?.id === value?.id) return;
    shown.current = value;
    setText(value?.label ?? "");
  }, [value]);
  const { options } = answer;
  const at = Math.min(active, Math.max(0, options.length - 1));

  const take = (option: Option | null) => {
    shown.current = option;
    setText(option?.label ?? "");
    setIsOpen(false);
    onChange(option);
  };
  const type = (typed: string) => {
    setText(typed);
    setActive(0);
    ask(typed);
    setIsOpen(typed !== "");
    if (typed === "" && value) take(null);
  };
  /** Leaving the field keeps what was chosen; words that chose nothing stay as typed. */
  const leave = () => {
    setIsOpen(false);
    if (value) setText(value.label);
  };
  const step = (by: 1 | -1) => {
    setIsOpen(true);
    if (isOpen && options.length > 0) setActive((at + by + options.length) % options.length);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const option = options[at];
    if (event.key === "ArrowDown") step(1);
    else if (event.key === "ArrowUp") step(-1);
    else if (event.key === "Enter" && isOpen && option) take(option);
    else if (event.key === "Escape" && isOpen) {
      setIsOpen(false);
      // The same key would close the dialog around the field.
      event.nativeEvent.stopImmediatePropagation();
    } else return;
    event.preventDefault();
  };
  return { answer, options, text, isOpen, at, take, type, leave, onKeyDown };
}

/** Finds one of many by typing; arrows move, Enter takes, Escape closes the list. */
export function Combobox<Option extends ComboboxOption>(props: ComboboxProps<Option>) {
  const { id, label, hint, error, after, from = 2 } = props;
  const list = useId();
  const box = useCombobox(props);
  const said = says(box.answer, from);
  const input = useRef<HTMLInputElement>(null);
  return (
    <Field label={label} htmlFor={id} hint={hint} error={error} after={after}>
      <div className="input shell combo">
        <input
          ref={input}
          id={id}
          type="text"
          role="combobox"
          aria-autocomplete="list"
          aria-expanded={box.isOpen}
          aria-controls={list}
          aria-activedescendant={box.isOpen && box.options.length > 0 ? `${list}-${box.at}` : undefined}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, { hint, error })}
          autoComplete="off"
          spellCheck={false}
          placeholder={props.placeholder}
          // biome-ignore lint/a11y/noAutofocus: the caller opens a dialog whose first question this is
          autoFocus={props.autoFocus}
          value={box.text}
          onChange={(event) => box.type(event.target.value)}
          onKeyDown={box.onKeyDown}
          onBlur={box.leave}
        />
        {box.text !== "" && (
          <button
            type="button"
            aria-label="Clear"
            onMouseDown={(event) => event.preventDefault()}
            onClick={() => {
              box.type("");
              input.current?.focus();
            }}
          >
            <Glyph name="cross" />
          </button>
        )}
        <div className="popup" hidden={!box.isOpen}>
          <div role="status">{box.isOpen && said && <div className="says">{said}</div>}</div>
          <div id={list} role="listbox" aria-label="Matches">
            {box.isOpen &&
              box.options.map((option, i) => (
                // biome-ignore lint/a11y/useKeyWithClickEvents: the field itself handles the keys of its list
                <div
                  key={option.id}
                  id={`${list}-${i}`}
                  role="option"
                  tabIndex={-1}
                  aria-selected={i === box.at}
                  className="option"
                  data-highlighted={i === box.at ? "" : undefined}
                  onMouseDown={(event) => event.preventDefault()}
                  onClick={() => box.take(option)}
                >
                  {option.label}
                  {option.detail && <span className="small">{option.detail}</span>}
                </div>
              ))}
          </div>
        </div>
      </div>
    </Field>
  );
}
