"use client";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";

/** Someone else saved this programme: nothing is lost until one of the two is chosen. */
export function ClashDialog({
  message,
  onTake,
  onKeep,
  onLater,
}: {
  message: string;
  onTake: () => void;
  onKeep: () => void;
  onLater: () => void;
}) {
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onLater()}
      title="Two people are changing this programme"
      lead={message}
      closeLabel="Decide later"
      actions={
        <>
          <Button kind="primary" onClick={onTake}>
            Take theirs
          </Button>
          <Button onClick={onKeep}>Save mine over it</Button>
        </>
      }
    />
  );
}
