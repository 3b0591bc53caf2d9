"use client";
import type { RecentChange } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { problemItems } from "@/api/form-problems";
import { useUndoMark } from "../hooks/use-undo-mark";

export interface ChangesSheetProps {
  changes: readonly RecentChange[];
  canUndo: boolean;
  onClose: () => void;
}

/** Who did what to which visit, newest first, with undo where nothing depends on it yet. */
export function ChangesSheet({ changes, canUndo, onClose }: ChangesSheetProps) {
  const undo = useUndoMark();
  const takeBack = (change: RecentChange) =>
    undo.mutate({
      appointmentId: change.appointmentId,
      version: change.version,
      isCancelled: change.kind === "cancelled",
    });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Recent changes"
      place="side"
      closeLabel="Close"
    >
      {undo.error && (
        <AlertLine tone="danger" live>
          {problemItems(undo.error)[0]?.message}
        </AlertLine>
      )}
      {changes.length === 0 && <p className="soft">Nothing was changed here yet.</p>}
      <ol className="recent">
        {changes.map((change) => (
          <li key={change.id}>
            <span className="num soft">{change.time}</span>
            <span>
              {change.byName} {change.what}
            </span>
            {change.canUndo && canUndo ? (
              <Button kind="plain" size="small" busy={undo.isPending} onClick={() => takeBack(change)}>
                Undo<span className="vh">: {change.what}</span>
              </Button>
            ) : (
              <span />
            )}
          </li>
        ))}
      </ol>
    </Dialog>
  );
}
