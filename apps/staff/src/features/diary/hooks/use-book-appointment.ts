import { weekdayDate } from "@withy/core/date-words";
import { useState } from "react";
import { type BookAppointment, bookAppointment } from "../api-client";
import { useDiaryMutation } from "./use-diary-mutation";

/** One key for each wording of the form: pressing twice books once, a corrected form is a new booking. */
export function useBookAppointment() {
  const [last, setLast] = useState({ body: "", key: "" });
  const run = (input: BookAppointment) => {
    const body = JSON.stringify(input);
    const key = body === last.body ? last.key : crypto.randomUUID();
    setLast({ body, key });
    return bookAppointment(input, key);
  };
  return useDiaryMutation(run, (view) => ({
    said: `${view.patient.name} booked for ${weekdayDate(view.day)}, ${view.startTime} with ${view.therapist.name}`,
  }));
}
