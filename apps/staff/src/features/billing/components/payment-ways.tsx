import type { PaymentMethod } from "@withy/billing/check-payment";
import { Key } from "@withy/ui/key";
import type { Ref } from "react";

const ways: readonly { method: PaymentMethod; label: string; detail: string }[] = [
  { method: "terminal", label: "Card reader", detail: "taken on the reader, written here" },
  { method: "card", label: "Card online", detail: "on the card company's page" },
  { method: "cash", label: "Cash", detail: "" },
  { method: "bank", label: "Bank", detail: "seen on the statement" },
];

interface PaymentWaysProps {
  ref: Ref<HTMLFieldSetElement>;
  method: PaymentMethod;
  onChoose: (method: PaymentMethod) => void;
}

/** The ways to pay as radio buttons; a number chooses one while the focus is among them. */
export function PaymentWays({ ref, method, onChoose }: PaymentWaysProps) {
  return (
    <fieldset
      ref={ref}
      className="field ways"
      onKeyDown={(event) => {
        const way = ways[Number(event.key) - 1];
        if (!way || event.ctrlKey || event.metaKey || event.altKey) return;
        event.preventDefault();
        onChoose(way.method);
        event.currentTarget.querySelector<HTMLInputElement>(`[value="${way.method}"]`)?.focus();
      }}
    >
      <legend>How</legend>
      {ways.map((way, i) => (
        <label key={way.method} className="way">
          <input
            type="radio"
            name="method"
            value={way.method}
            checked={method === way.method}
            onChange={() => onChoose(way.method)}
          />
          <span>{way.label}</span>
          <span className="soft small">{way.detail}</span>
          <Key>{`${i + 1}`}</Key>
        </label>
      ))}
    </fieldset>
  );
}
