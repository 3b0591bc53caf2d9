"use client";
import { messageTemplateWords } from "@withy/contracts/message-words";
import type { MessageRow } from "@withy/contracts/messaging";
import { timeOf } from "@withy/core/wall-clock";
import { Button } from "@withy/ui/button";
import { useChanges } from "@withy/ui/recent-changes";
import { ApiError } from "@/api/request";
import { useSendAgain } from "../hooks/use-send-again";

export function SendAgain({ row, zone }: { row: MessageRow; zone: string }) {
  const send = useSendAgain();
  const { announce } = useChanges();
  const what = messageTemplateWords[row.template].toLowerCase();
  const again = () =>
    send.mutate(row.id, {
      onSuccess: () =>
        announce({
          at: timeOf(new Date(), zone),
          said: `On its way again: ${what}${row.patientName ? `, ${row.patientName}` : ""}`,
        }),
    });
  return (
    <>
      <Button size="small" busy={send.isPending} onClick={again}>
        Send again
        <span className="vh">
          : {what}, {row.toAddress}
        </span>
      </Button>
      {send.error && (
        <span className="message-problem danger" role="alert">
          {send.error instanceof ApiError
            ? send.error.problem.detail
            : "It could not be sent again. Try once more."}
        </span>
      )}
    </>
  );
}
