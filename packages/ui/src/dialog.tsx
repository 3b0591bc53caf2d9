"use client";
import { Dialog as Base } from "@base-ui/react/dialog";
import { type ReactNode, type RefObject, useRef } from "react";
import { Button } from "./button";

export interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** Names the dialog: a verb and what it is about. */
  title: ReactNode;
  lead?: ReactNode;
  /** "centre" asks for a decision and blocks the page; "side" lies on the page's edge and leaves it in reach. */
  place?: "centre" | "side";
  size?: "usual" | "wide";
  /** The verbs at the foot, main one first. */
  actions?: ReactNode;
  /** Words of the closing button. */
  closeLabel?: string;
  initialFocus?: RefObject<HTMLElement | null>;
  children?: ReactNode;
}

/** Focus moves in and returns to where it came from; Escape closes it. */
export function Dialog(props: DialogProps) {
  const { open, onOpenChange, title, lead, place = "centre", size = "usual", actions, children } = props;
  const blocking = place === "centre";
  const popup = useRef<HTMLDivElement>(null);
  // A question is answered in its first field, not on a link beside it; without a field the first verb is at hand.
  const firstField = () =>
    popup.current?.querySelector<HTMLElement>("input:not([type=hidden]), select, textarea") ?? true;
  return (
    <Base.Root open={open} onOpenChange={onOpenChange} modal={blocking} disablePointerDismissal={!blocking}>
      <Base.Portal>
        {blocking && <Base.Backdrop className="veil" />}
        <Base.Popup
          className="dlg"
          data-place={place}
          data-size={size}
          ref={popup}
          initialFocus={props.initialFocus ?? firstField}
        >
          <Base.Title>{title}</Base.Title>
          {lead && <Base.Description className="lead">{lead}</Base.Description>}
          <div className="content">{children}</div>
          <div className="fin">
            {actions}
            <Base.Close render={<Button shortcut="Esc">{props.closeLabel ?? "Leave it"}</Button>} />
          </div>
        </Base.Popup>
      </Base.Portal>
    </Base.Root>
  );
}
