"use client";
import type { InvoiceLineView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { Button } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";

export interface KeptLine {
  lineId: string;
  quantity: number;
  discountBasisPoints: number;
}

interface DraftLinesProps {
  today: string;
  lines: readonly InvoiceLineView[];
  busy: boolean;
  /** Something was typed that is not saved yet. */
  onDirty: () => void;
  onChange: (lines: KeptLine[]) => void;
}

interface LineText {
  quantity: string;
  discount: string;
}

const textOf = (line: InvoiceLineView): LineText => ({
  quantity: String(line.quantity),
  discount: String(line.discountBasisPoints / 100),
});

function read(text: LineText): { quantity: number; discountBasisPoints: number } | null {
  const quantity = Number(text.quantity);
  const discount = Number(text.discount.replace("%", "").trim() || "0");
  const isWhole = Number.isInteger(quantity) && quantity > 0 && quantity < 100;
  if (!isWhole || !(discount >= 0 && discount <= 100)) return null;
  return { quantity, discountBasisPoints: Math.round(discount * 100) };
}

/** Quantity and discount of each line, and a way to take the line off. */
export function DraftLines({ today, lines, busy, onDirty, onChange }: DraftLinesProps) {
  const [texts, setTexts] = useState<Record<string, LineText>>({});
  const now = lines.map((line) => ({ line, text: texts[line.id] ?? textOf(line) }));
  const kept = now.flatMap(({ line, text }) => {
    const values = read(text);
    return values ? [{ lineId: line.id, ...values }] : [];
  });
  const isWhole = kept.length === lines.length;
  const isChanged = Object.keys(texts).length > 0;
  const change = (id: string, text: LineText) => {
    setTexts((all) => ({ ...all, [id]: text }));
    onDirty();
  };
  return (
    <section className="draftlines" aria-labelledby="lines-title">
      <SectionHead id="lines-title" title="Lines" level={3} />
      <ul>
        {now.map(({ line, text }) => (
          <li key={line.id}>
            <p>
              {line.description}
              {line.kind === "visit" && line.on !== null && (
                <span className="soft small num"> {shortDate(line.on, today)}</span>
              )}
            </p>
            <div className="linefields">
              {line.kind !== "visit" && (
                <TextInput
                  id={`quantity-${line.id}`}
                  label="Quantity"
                  inputMode="numeric"
                  span="short"
                  value={text.quantity}
                  onChange={(e) => change(line.id, { ...text, quantity: e.target.value })}
                />
              )}
              <TextInput
                id={`discount-${line.id}`}
                label="Discount %"
                inputMode="decimal"
                span="short"
                value={text.discount}
                onChange={(e) => change(line.id, { ...text, discount: e.target.value })}
                error={read(text) ? undefined : "Enter a whole quantity, and a discount of 0 to 100."}
              />
              {lines.length > 1 && (
                <Button
                  kind="plain"
                  size="small"
                  busy={busy}
                  onClick={() => onChange(kept.filter((one) => one.lineId !== line.id))}
                >
                  Take off<span className="vh">: {line.description}</span>
                </Button>
              )}
            </div>
          </li>
        ))}
      </ul>
      {isChanged && (
        <Button disabled={!isWhole} busy={busy} onClick={() => onChange(kept)}>
          Save the lines
        </Button>
      )}
    </section>
  );
}
