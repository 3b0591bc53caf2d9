"use client";
import type { WaitingRow } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { problemItems } from "@/api/form-problems";
import { useWaitingMutation } from "../hooks/use-waiting";
import { withdrawWaiting } from "../waiting-client";

interface Props {
  row: WaitingRow;
  zone: string;
  onClose: () => void;
}

export function WithdrawDialog({ row, zone, onClose }: Props) {
  const said = () => `${row.patient.name} taken off the waiting list`;
  const withdraw = useWaitingMutation(withdrawWaiting, said, zone);
  const submit = () => withdraw.mutate({ entryId: row.id, version: row.version }, { onSuccess: onClose });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Take ${row.patient.name} off the list`}
      lead={`${row.service.name}. No more times are offered to them.`}
      closeLabel="Keep them"
      actions={
        <Button kind="stop" busy={withdraw.isPending} onClick={submit}>
          Take off the list
        </Button>
      }
    >
      {withdraw.error && (
        <AlertLine tone="danger" live>
          {problemItems(withdraw.error)[0]?.message}
        </AlertLine>
      )}
      {row.openRoundId && <p>A time is on offer to them now. Their link stops working.</p>}
    </Dialog>
  );
}
