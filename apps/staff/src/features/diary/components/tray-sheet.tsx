"use client";
import type { PutAsideItem } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { problemItems } from "@/api/form-problems";
import { useRemovePutAside } from "../hooks/use-put-aside";

export interface TraySheetProps {
  items: readonly PutAsideItem[];
  onTakeUp: (item: PutAsideItem) => void;
  onClose: () => void;
}

/** What one has put aside, the last first. */
export function TraySheet({ items, onTakeUp, onClose }: TraySheetProps) {
  const remove = useRemovePutAside();
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Put aside"
      place="side"
      closeLabel="Close"
    >
      {remove.error && (
        <AlertLine tone="danger" live>
          {problemItems(remove.error)[0]?.message}
        </AlertLine>
      )}
      {items.length === 0 && <p className="soft">Nothing is put aside.</p>}
      <ol className="recent">
        {items.map((item) => (
          <li key={item.id}>
            <span className="num soft">{item.time}</span>
            <button type="button" className="linklike" onClick={() => onTakeUp(item)}>
              {item.title}
            </button>
            <Button kind="plain" size="small" busy={remove.isPending} onClick={() => remove.mutate(item.id)}>
              Remove<span className="vh">: {item.title}</span>
            </Button>
          </li>
        ))}
      </ol>
    </Dialog>
  );
}
