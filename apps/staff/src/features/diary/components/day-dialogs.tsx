"use client";
import type { AppointmentView, DiaryDayView, PutAsideItem } from "@withy/contracts/diary";
import dynamic from "next/dynamic";
import type { Cursor } from "../day-cursor";
import { useAppointment } from "../hooks/use-appointment";
import { useChoices } from "../hooks/use-choices";
import { clock } from "../minute-words";
import { bookingAside } from "../put-aside-typed";
import { wantedTime } from "../wanted-time";

const BookingDialog = dynamic(() => import("./booking-dialog").then((m) => m.BookingDialog));
const MoveDialog = dynamic(() => import("./move-dialog").then((m) => m.MoveDialog));
const CancelDialog = dynamic(() => import("./cancel-dialog").then((m) => m.CancelDialog));

export type OpenDialog =
  | { readonly kind: "book"; readonly cursor: Cursor }
  | { readonly kind: "resume"; readonly item: PutAsideItem }
  | { readonly kind: "move" | "cancel"; readonly id: string }
  | null;

export interface DayDialogsProps {
  dialog: OpenDialog;
  day: DiaryDayView;
  today: string;
  onClose: () => void;
  /** After a booking or a move: where the visit now is. */
  onShow: (view: AppointmentView) => void;
}

/** The booking, as the cursor stands: its therapist or room, its day and its minute. */
function startAt(day: DiaryDayView, cursor: Cursor) {
  const column = day.columns[cursor.column];
  const who = day.by === "room" ? { roomId: column?.id ?? "" } : { therapistId: column?.id ?? "" };
  return wantedTime({ day: day.day, time: clock(cursor.minute), siteId: column?.siteId ?? "", ...who });
}

/** The dialog that is open, loaded only when it is first needed. */
export function DayDialogs({ dialog, day, today, onClose, onShow }: DayDialogsProps) {
  const isBooking = dialog?.kind === "book" || dialog?.kind === "resume";
  const needsChoices = isBooking || dialog?.kind === "move";
  const choices = useChoices(needsChoices).data;
  const view = useAppointment(dialog && "id" in dialog ? dialog.id : null).data;
  if (isBooking && choices) {
    return (
      <BookingDialog
        start={
          dialog.kind === "resume"
            ? bookingAside(dialog.item)
            : { wanted: startAt(day, dialog.cursor), patient: null, serviceId: "" }
        }
        choices={choices}
        today={today}
        onClose={onClose}
        onBooked={onShow}
      />
    );
  }
  if (dialog?.kind === "move" && view && choices) {
    return <MoveDialog view={view} choices={choices} today={today} onClose={onClose} onMoved={onShow} />;
  }
  if (dialog?.kind === "cancel" && view) return <CancelDialog view={view} onClose={onClose} />;
  return null;
}
