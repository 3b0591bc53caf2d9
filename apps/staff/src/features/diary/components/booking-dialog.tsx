"use client";
import type { AppointmentView, BookingChoicesView } from "@withy/contracts/diary";
import { shortDate, weekdayDate } from "@withy/core/date-words";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Combobox } from "@withy/ui/combobox";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { useState } from "react";
import { findPatients } from "@/api/find-patients";
import { problemItems } from "@/api/form-problems";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { useBookAppointment } from "../hooks/use-book-appointment";
import { useHoldTime } from "../hooks/use-hold-time";
import { usePutAside, useRemovePutAside } from "../hooks/use-put-aside";
import { useTimeForm } from "../hooks/use-time-form";
import { readTime } from "../minute-words";
import { asideBooking, type TypedBooking } from "../put-aside-typed";
import { startsAtText } from "../wanted-time";
import { NextTimes } from "./next-times";
import { TimeFields } from "./time-fields";

export interface BookingDialogProps {
  start: TypedBooking;
  choices: BookingChoicesView;
  today: string;
  onClose: () => void;
  onBooked: (view: AppointmentView) => void;
}

const prefix = "book";

/** Books one visit. A refusal keeps everything that was typed and says what to do. */
export function BookingDialog({ start, choices, today, onClose, onBooked }: BookingDialogProps) {
  const book = useBookAppointment();
  const form = useTimeForm(prefix, start.wanted, book.error, start.reason);
  const { wanted } = form;
  const [patient, setPatient] = useState(start.patient);
  const [serviceId, setServiceId] = useState(start.serviceId);
  const [deskNote, setDeskNote] = useState(start.deskNote ?? "");
  const service = choices.services.find(({ id }) => id === serviceId);
  const typed = { wanted, patient, serviceId, deskNote, reason: form.reason, asideId: start.asideId ?? null };
  useHoldTime(wanted, service?.durationMinutes, JSON.stringify(typed));
  const putAside = usePutAside();
  const removeAside = useRemovePutAside();
  const lay = () => putAside.mutate(asideBooking(typed, service?.name), { onSuccess: onClose });
  useShortcut("put-aside", lay);

  const booked = (view: AppointmentView) => {
    if (start.asideId) removeAside.mutate(start.asideId);
    onBooked(view);
  };
  const submit = () => {
    const missing = [
      ...(patient ? [] : [{ id: "book-patientId", message: "Choose a patient" }]),
      ...(serviceId ? [] : [{ id: "book-serviceId", message: "Choose what the visit is for" }]),
    ];
    const startsAt = startsAtText(wanted);
    if (!form.check(missing) || !patient || !startsAt) return;
    const { therapistId, siteId, roomId } = wanted;
    const input = { patientId: patient.id, serviceId, therapistId, siteId, roomId: roomId || null, startsAt };
    book.mutate({ ...input, deskNote, overrideReason: form.reason || null }, { onSuccess: booked });
  };

  const when =
    wanted.day && readTime(wanted.timeText)
      ? ` ${weekdayDate(wanted.day)}, ${readTime(wanted.timeText)}`
      : "";
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      size="wide"
      title="Book an appointment"
      actions={
        <>
          <Button kind="primary" busy={book.isPending} type="submit" form="book-form">
            Book{when}
          </Button>
          <Button shortcut="Ctrl ." busy={putAside.isPending} onClick={lay}>
            Put aside
          </Button>
        </>
      }
    >
      <form
        id="book-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        {putAside.error && (
          <AlertLine tone="danger" live>
            {problemItems(putAside.error)[0]?.message}
          </AlertLine>
        )}
        <ErrorSummary
          errors={form.errors}
          attempt={`${form.attempt} ${book.failureCount} ${book.submittedAt}`}
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
        <Combobox
          id="book-patientId"
          label="Patient"
          hint={
            <>
              Name, date of birth, phone or NHS number. Someone new?{" "}
              <Link href="/patients/new">Register them first</Link>
            </>
          }
          value={patient}
          onChange={setPatient}
          search={findPatients}
          error={form.errorOf("book-patientId")}
        />
        <Select
          id="book-serviceId"
          label="For"
          placeholder="Choose what the visit is for"
          value={serviceId}
          onChange={(event) => setServiceId(event.target.value)}
          options={choices.services.map((s) => ({
            value: s.id,
            label: `${s.name}, ${s.durationMinutes} min`,
          }))}
          error={form.errorOf("book-serviceId")}
        />
        <TimeFields
          prefix={prefix}
          choices={choices}
          serviceId={serviceId}
          wanted={wanted}
          onChange={form.change}
          today={today}
          errorOf={form.errorOf}
        />
        {form.asksReason && (
          <TextInput
            id="book-overrideReason"
            label="Why book it all the same"
            hint="Kept with the visit"
            value={form.reason}
            onChange={(event) => form.setReason(event.target.value)}
            error={form.errorOf("book-overrideReason")}
          />
        )}
        <TextInput
          id="book-deskNote"
          label="Desk note"
          hint="For the front desk, not clinical. May be left empty"
          value={deskNote}
          onChange={(event) => setDeskNote(event.target.value)}
          error={form.errorOf("book-deskNote")}
        />
      </form>
    </Dialog>
  );
}
