"use client";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";

interface Props {
  name: string;
  isEnding: boolean;
  onEnd: () => void;
  onClose: () => void;
}

/** Asks before someone's access ends. */
export function EndAccessDialog({ name, isEnding, onEnd, onClose }: Props) {
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`End the access of ${name}`}
      lead="They are signed out at once and cannot sign in. Their name stays under what they wrote."
      actions={
        <Button kind="stop" busy={isEnding} onClick={onEnd}>
          End access
        </Button>
      }
    />
  );
}
