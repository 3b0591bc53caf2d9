import type { WaitingRow } from "@withy/contracts/diary";
import { plainDateWords } from "@withy/core/date-words";
import type { PartOfDay } from "@withy/diary/time-wishes";
import type { Urgency } from "@withy/diary/waiting-words";

/** The form of someone who waits, as it is being filled in. */
export interface WaitingForm {
  serviceId: string;
  urgency: Urgency;
  /** "1" Monday to "7" Sunday; none means any. */
  weekdays: readonly string[];
  partsOfDay: readonly string[];
  siteIds: readonly string[];
  therapistId: string;
  latestText: string;
  latestOn: string | null;
  noticeText: string;
  insteadOfId: string;
  deskNote: string;
}

export function waitingForm(row: WaitingRow | null, serviceId: string): WaitingForm {
  const wishes = row?.wishes ?? {};
  return {
    serviceId: row?.service.id ?? serviceId,
    urgency: row?.urgency ?? "routine",
    weekdays: (wishes.weekdays ?? []).map(String),
    partsOfDay: wishes.partsOfDay ?? [],
    siteIds: wishes.siteIds ?? [],
    therapistId: wishes.therapistIds?.[0] ?? "",
    latestText: wishes.latestOn === undefined ? "" : plainDateWords(wishes.latestOn),
    latestOn: wishes.latestOn ?? null,
    noticeText: wishes.noticeHours === undefined ? "" : String(wishes.noticeHours),
    insteadOfId: row?.insteadOf?.id ?? "",
    deskNote: row?.deskNote ?? "",
  };
}

export interface FormProblem {
  id: string;
  message: string;
}

export function waitingProblems(form: WaitingForm, hasPatient: boolean): FormProblem[] {
  const problems: FormProblem[] = [];
  if (!hasPatient) problems.push({ id: "waiting-patientId", message: "Choose the patient" });
  if (form.serviceId === "")
    problems.push({ id: "waiting-serviceId", message: "Choose what the visit is for" });
  if (form.latestText.trim() !== "" && form.latestOn === null)
    problems.push({
      id: "waiting-latestOn",
      message: "Enter a date, such as 18 December, or leave it empty",
    });
  if (!/^\s*\d{0,3}\s*$/.test(form.noticeText))
    problems.push({ id: "waiting-noticeHours", message: "Enter whole hours, such as 24, or leave it empty" });
  return problems;
}

/** What is sent. A wish that is not asked for is not there. */
export function waitingInput(form: WaitingForm) {
  return {
    serviceId: form.serviceId,
    urgency: form.urgency,
    insteadOfId: form.insteadOfId || null,
    deskNote: form.deskNote,
    wishes: {
      weekdays: form.weekdays.map(Number),
      partsOfDay: form.partsOfDay as PartOfDay[],
      siteIds: [...form.siteIds],
      therapistIds: form.therapistId === "" ? [] : [form.therapistId],
      latestOn: form.latestOn,
      noticeHours: Number(form.noticeText.trim() || 0),
    },
  };
}
