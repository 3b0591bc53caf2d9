"use client";
import { Dialog } from "@withy/ui/dialog";
import { RecentChanges } from "@withy/ui/recent-changes";

/** What was done in this window, and its undo. */
export function RecentSheet({ onClose }: { onClose: () => void }) {
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Recent changes"
      place="side"
      closeLabel="Close"
    >
      <RecentChanges />
    </Dialog>
  );
}
