"use client";
import type { OpenCardPaymentView } from "@withy/contracts/billing";
import { formatMoney } from "@withy/core/money";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, Buttons } from "@withy/ui/button";
import { useCardPayment } from "../hooks/use-card-payment";

/** A card payment that was begun and has not ended: it holds its amount until it is paid or closed. */
export function OpenCardPayment({ card }: { card: OpenCardPaymentView }) {
  const check = useCardPayment("check");
  const cancel = useCardPayment("cancel");
  const error = check.error ?? cancel.error;
  return (
    <div className="opencard">
      <AlertLine>
        A card payment of {formatMoney(card.amountPence)} was begun at {card.startedTime} and is not finished.
        Ask how it stands, or close it to take the money another way.
      </AlertLine>
      {error && <AlertLine tone="danger">{error.message}</AlertLine>}
      <Buttons>
        <Button busy={check.isPending} onClick={() => check.mutate(card.id)}>
          Ask how it stands
        </Button>
        <Button kind="stop" busy={cancel.isPending} onClick={() => cancel.mutate(card.id)}>
          Close it
        </Button>
      </Buttons>
    </div>
  );
}
