"use client";
import type { DayAppointment } from "@withy/contracts/diary";
import type { useDayVerbs } from "../hooks/use-day-verbs";
import { AppointmentSheet } from "./appointment-sheet";
import type { OpenDialog } from "./day-dialogs";

export interface DaySheetProps {
  id: string;
  /** The visit where the shown day has it. */
  chosen: DayAppointment | null;
  today: string;
  may: { book: boolean; mark: boolean; cancel: boolean };
  verbs: ReturnType<typeof useDayVerbs>;
  dialog: OpenDialog;
  onDialog: (dialog: OpenDialog) => void;
  onClose: () => void;
}

/** The sheet of the chosen visit, with the day's verbs on it. */
export function DaySheet({ id, chosen, today, may, verbs, dialog, onDialog, onClose }: DaySheetProps) {
  return (
    <AppointmentSheet
      appointmentId={id}
      today={today}
      isEditing={dialog !== null && "id" in dialog && dialog.id === id}
      onClose={onClose}
      onMove={may.book ? () => onDialog({ kind: "move", id }) : undefined}
      verbs={{
        canBook: may.book,
        canMark: may.mark && chosen !== null,
        canCancel: may.cancel,
        isBusy: verbs.isBusy,
        onMark: (to) => chosen && verbs.mark(chosen, to),
        onCancel: () => onDialog({ kind: "cancel", id }),
        onUndo: () => chosen && verbs.undo(chosen),
      }}
    />
  );
}
