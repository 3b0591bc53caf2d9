"use client";
import { type PaymentMethod, paymentMethodWords } from "@withy/billing/check-payment";
import { checkRefund } from "@withy/billing/check-refund";
import type { InvoiceView, PaymentView } from "@withy/contracts/billing";
import { plainDateWords } from "@withy/core/date-words";
import { formatMoney, parseMoney } from "@withy/core/money";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useRefundPayment } from "../hooks/use-refund-payment";

interface RefundDialogProps {
  invoice: InvoiceView;
  payment: PaymentView;
  onClose: () => void;
}

const inputId = (field: string) => (field === "amountPence" ? "refund-amount" : `refund-${field}`);
const byHand: readonly PaymentMethod[] = ["cash", "terminal", "bank"];

/** Gives money back from one payment: how much, how, why, and whether it is to be paid again. */
export function RefundDialog({ invoice, payment, onClose }: RefundDialogProps) {
  const refund = useRefundPayment();
  const left = payment.amountPence - payment.refundedPence;
  const [amount, setAmount] = useState(formatMoney(left).slice(1));
  const [method, setMethod] = useState<PaymentMethod>(payment.method);
  const [reason, setReason] = useState("");
  const [isOwedAgain, setOwedAgain] = useState(false);
  const [wrong, setWrong] = useState<FieldError[]>([]);
  const pence = parseMoney(amount);
  const errors = wrong.length > 0 ? wrong : refund.error ? problemItems(refund.error, inputId) : [];
  const errorOf = (id: string) => errors.find((e) => e.id === id)?.message;
  const submit = () => {
    const wish = { amountPence: pence ?? 0, method, reason };
    const no = pence === null ? null : checkRefund(payment, wish);
    const found =
      pence === null ? [{ id: "refund-amount", message: "Enter an amount of money, such as 62.00." }] : [];
    if (no) found.push({ id: inputId(no.field ?? "amountPence"), message: no.message });
    setWrong(found);
    if (found.length === 0)
      refund.mutate({ paymentId: payment.id, ...wish, isOwedAgain }, { onSuccess: onClose });
  };
  const methods = payment.method === "card" ? (["card"] as const) : byHand;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Give money back on ${invoice.reference}`}
      lead={`${formatMoney(payment.amountPence)} was taken by ${paymentMethodWords[payment.method]} on ${plainDateWords(payment.on)}.`}
      closeLabel="Keep it"
      actions={
        <Button kind="stop" type="submit" form="refund-form" busy={refund.isPending}>
          {pence === null ? "Give back" : `Give back ${formatMoney(pence)}`}
        </Button>
      }
    >
      <form
        id="refund-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary errors={errors} attempt={refund.submittedAt} />
        <TextInput
          id="refund-amount"
          label="Amount in pounds"
          inputMode="decimal"
          span="short"
          value={amount}
          onChange={(event) => setAmount(event.target.value)}
          error={errorOf("refund-amount")}
        />
        <Select
          id="refund-method"
          label="How the money goes back"
          options={methods.map((m) => ({
            value: m,
            label: m === "card" ? "to the same card" : paymentMethodWords[m],
          }))}
          value={method}
          onChange={(event) => setMethod(event.target.value as PaymentMethod)}
          error={errorOf("refund-method")}
        />
        <FieldGroup legend="The invoice afterwards" id="refund-after">
          <Check type="radio" name="after" checked={!isOwedAgain} onChange={() => setOwedAgain(false)}>
            This amount is no longer asked for
          </Check>
          <Check type="radio" name="after" checked={isOwedAgain} onChange={() => setOwedAgain(true)}>
            It is owed again, because it was taken by mistake
          </Check>
        </FieldGroup>
        <TextInput
          id="refund-reason"
          label="Why"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={errorOf("refund-reason")}
        />
      </form>
    </Dialog>
  );
}
