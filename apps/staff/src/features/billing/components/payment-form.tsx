"use client";
import { checkPayment, type PaymentMethod, paymentMethodWords } from "@withy/billing/check-payment";
import type { InvoiceView } from "@withy/contracts/billing";
import { formatMoney, parseMoney } from "@withy/core/money";
import { Button } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { Key } from "@withy/ui/key";
import { TextInput } from "@withy/ui/text-input";
import { useRef, useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useAwake } from "@/components/use-awake";
import { useStartCardPayment } from "../hooks/use-start-card-payment";
import { useTakePayment } from "../hooks/use-take-payment";
import { PaymentWays } from "./payment-ways";

const inputId = (field: string) => (field === "amountPence" ? "pay-amount" : `pay-${field}`);

/** Takes money in four keys: P to come here, a number for the way, Enter, and the amount is already there. */
export function PaymentForm({ invoice }: { invoice: InvoiceView }) {
  const take = useTakePayment();
  const start = useStartCardPayment();
  const isAwake = useAwake();
  const ways = useRef<HTMLFieldSetElement>(null);
  const [amount, setAmount] = useState(formatMoney(invoice.freePence).slice(1));
  const [method, setMethod] = useState<PaymentMethod>("terminal");
  const [reference, setReference] = useState("");
  const [wrong, setWrong] = useState<string | null>(null);
  useShortcut("pay", () => ways.current?.querySelector<HTMLInputElement>("input:checked")?.focus());

  const pence = parseMoney(amount);
  const failed = take.error ?? start.error;
  const errors =
    wrong === null ? (failed ? problemItems(failed, inputId) : []) : [{ id: "pay-amount", message: wrong }];
  const submit = () => {
    const refusal = checkPayment(invoice, pence ?? 0);
    const sentence = pence === null ? "Enter an amount of money, such as 62.00." : (refusal?.message ?? null);
    setWrong(sentence);
    if (sentence !== null || pence === null) return;
    const input = { invoiceId: invoice.id, amountPence: pence };
    if (method === "card") start.mutate(input);
    else take.mutate({ ...input, method, reference }, { onSuccess: (view) => startAgain(view.freePence) });
  };
  const startAgain = (freePence: number) => {
    setAmount(formatMoney(freePence).slice(1));
    setReference("");
  };
  const isWhole = pence === invoice.owedPence;
  return (
    <form
      className="payform"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <h2>
        Take payment <Key>P</Key>
      </h2>
      <ErrorSummary errors={errors} attempt={take.submittedAt + start.submittedAt} />
      <TextInput
        id="pay-amount"
        label="Amount in pounds"
        inputMode="decimal"
        className="amt num"
        value={amount}
        onChange={(event) => setAmount(event.target.value)}
        onFocus={(event) => event.target.select()}
        error={errors.find((e) => e.id === "pay-amount")?.message}
        after={isWhole ? "All that is owed on this invoice. Type less to take part." : undefined}
      />
      <PaymentWays ref={ways} method={method} onChoose={setMethod} />
      {(method === "terminal" || method === "bank") && (
        <TextInput
          id="pay-reference"
          label={method === "bank" ? "Reference on the statement (optional)" : "Receipt number (optional)"}
          value={reference}
          onChange={(event) => setReference(event.target.value)}
        />
      )}
      <Button
        kind="primary"
        size="wide"
        type="submit"
        disabled={!isAwake}
        shortcut="Enter"
        busy={take.isPending || start.isPending}
      >
        {pence === null ? "Take payment" : `Take ${formatMoney(pence)} by ${paymentMethodWords[method]}`}
      </Button>
      {pence !== null && pence <= invoice.owedPence && (
        <p className="hint num">Then {formatMoney(invoice.owedPence - pence)} is owed.</p>
      )}
    </form>
  );
}
