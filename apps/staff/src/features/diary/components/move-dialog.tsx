"use client";
import type { AppointmentView, BookingChoicesView } from "@withy/contracts/diary";
import { shortDate, titleDate, weekdayDate } from "@withy/core/date-words";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useMoveAppointment } from "../hooks/use-move-appointment";
import { useTimeForm } from "../hooks/use-time-form";
import { readTime } from "../minute-words";
import { startsAtText, wantedTime } from "../wanted-time";
import { NextTimes } from "./next-times";
import { TimeFields } from "./time-fields";

export interface MoveDialogProps {
  view: AppointmentView;
  choices: BookingChoicesView;
  today: string;
  onClose: () => void;
  onMoved: (view: AppointmentView) => void;
}

const prefix = "move";

/** Moves a visit to another time, therapist, site or room: all that dragging does, and more. */
export function MoveDialog({ view, choices, today, onClose, onMoved }: MoveDialogProps) {
  const move = useMoveAppointment();
  const start = wantedTime({
    day: view.day,
    time: view.startTime,
    siteId: view.site.id,
    therapistId: view.therapist.id,
    roomId: view.room.id,
  });
  const form = useTimeForm(prefix, start, move.error);
  const { wanted } = form;

  const submit = () => {
    const startsAt = startsAtText(wanted);
    if (!form.check() || !startsAt) return;
    const { therapistId, siteId, roomId } = wanted;
    const input = { appointmentId: view.id, version: view.version, startsAt, therapistId, siteId };
    move.mutate(
      {
        ...input,
        roomId: roomId || null,
        overrideReason: form.reason || null,
        origin: {
          startsAt: view.startsAt,
          siteId: view.site.id,
          therapistId: view.therapist.id,
          roomId: view.room.id,
        },
      },
      { onSuccess: onMoved },
    );
  };

  const when =
    wanted.day && readTime(wanted.timeText)
      ? ` to ${weekdayDate(wanted.day)}, ${readTime(wanted.timeText)}`
      : "";
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Move ${view.patient.name}`}
      lead={`From ${titleDate(view.day)}, ${view.startTime}, with ${view.therapist.name} in ${view.room.name}.`}
      actions={
        <Button kind="primary" busy={move.isPending} type="submit" form="move-form">
          Move{when}
        </Button>
      }
    >
      <form
        id="move-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary
          errors={form.errors}
          attempt={`${form.attempt} ${move.submittedAt} ${move.failureCount}`}
        />
        {form.taken && (
          <NextTimes
            taken={form.taken}
            onTake={(free) =>
              form.change({
                day: free.day,
                dayText: shortDate(free.day),
                timeText: free.startTime,
                roomId: free.roomId,
              })
            }
          />
        )}
        <TimeFields
          prefix={prefix}
          choices={choices}
          serviceId={view.service.id}
          wanted={wanted}
          onChange={form.change}
          today={today}
          errorOf={form.errorOf}
        />
        {form.asksReason && (
          <TextInput
            id="move-overrideReason"
            label="Why move it there all the same"
            hint="Kept with the visit"
            value={form.reason}
            onChange={(event) => form.setReason(event.target.value)}
            error={form.errorOf("move-overrideReason")}
          />
        )}
      </form>
    </Dialog>
  );
}
