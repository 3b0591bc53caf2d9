import type {
  GpPracticeView,
  PatientView,
  PreferredChannel,
  RegisterPatientInput,
  Sex,
} from "@withy/contracts/patients";
import { plainDateWords, readDate } from "@withy/core/date-words";
import { parseMoney } from "@withy/core/money";

export interface SurgeryOption {
  id: string;
  label: string;
  detail?: string;
}

/** The form as typed: text stays text until it is saved. */
export interface PatientForm {
  givenName: string;
  familyName: string;
  preferredName: string;
  bornOn: string;
  sex: Sex | "";
  phone: string;
  hasNoPhone: boolean;
  email: string;
  addressLines: string;
  postcode: string;
  nhsNumber: string;
  gpPractice: SurgeryOption | null;
  gpName: string;
  communicationNeeds: string;
  preferredChannel: PreferredChannel;
  nextOfKin: string;
  homeSiteId: string;
  usualTherapistId: string;
  payerId: string;
  policyNumber: string;
  authorisationCode: string;
  sessionsAuthorised: string;
  excessPence: string;
}

export const emptyForm = (homeSiteId: string): PatientForm => ({
  givenName: "",
  familyName: "",
  preferredName: "",
  bornOn: "",
  sex: "",
  phone: "",
  hasNoPhone: false,
  email: "",
  addressLines: "",
  postcode: "",
  nhsNumber: "",
  gpPractice: null,
  gpName: "",
  communicationNeeds: "",
  preferredChannel: "email",
  nextOfKin: "",
  homeSiteId,
  usualTherapistId: "",
  payerId: "",
  policyNumber: "",
  authorisationCode: "",
  sessionsAuthorised: "",
  excessPence: "",
});

export function formFrom(view: PatientView): PatientForm {
  const { care, payer } = view;
  return {
    givenName: view.givenName,
    familyName: view.familyName,
    preferredName: view.preferredName ?? "",
    bornOn: plainDateWords(view.bornOn),
    sex: care?.sex ?? "",
    phone: view.phone ?? "",
    hasNoPhone: view.phone === null,
    email: view.email ?? "",
    addressLines: view.addressLines.join("\n"),
    postcode: view.postcode ?? "",
    nhsNumber: care?.nhsNumber ?? "",
    gpPractice: care?.gpPractice ? { id: care.gpPractice.id, label: care.gpPractice.name } : null,
    gpName: care?.gpName ?? "",
    communicationNeeds: care?.communicationNeeds ?? "",
    preferredChannel: view.preferredChannel,
    nextOfKin: care?.nextOfKin ?? "",
    homeSiteId: view.homeSite.id,
    usualTherapistId: care?.usualTherapist?.id ?? "",
    payerId: payer?.payerId ?? "",
    policyNumber: payer?.policyNumber ?? "",
    authorisationCode: payer?.authorisationCode ?? "",
    sessionsAuthorised: payer?.sessionsAuthorised?.toString() ?? "",
    excessPence: payer ? (payer.excessPence / 100).toFixed(2) : "",
  };
}

/** What is sent. Text that cannot be read goes as it is, so that the answer speaks of that field. */
export function inputFrom(form: PatientForm, today: string): RegisterPatientInput {
  return {
    givenName: form.givenName,
    familyName: form.familyName,
    preferredName: form.preferredName,
    bornOn: readDate(form.bornOn, today, { past: true }) ?? "",
    sex: form.sex === "" ? null : form.sex,
    phone: form.phone,
    hasNoPhone: form.hasNoPhone,
    email: form.email,
    addressLines: form.addressLines.split("\n").filter((line) => line.trim() !== ""),
    postcode: form.postcode,
    nhsNumber: form.nhsNumber,
    gpPracticeId: form.gpPractice?.id ?? null,
    gpName: form.gpName,
    communicationNeeds: form.communicationNeeds,
    preferredChannel: form.preferredChannel,
    nextOfKin: form.nextOfKin,
    homeSiteId: form.homeSiteId,
    usualTherapistId: form.usualTherapistId || null,
    payer: form.payerId === "" ? null : payerFrom(form),
  };
}

function payerFrom(form: PatientForm): NonNullable<RegisterPatientInput["payer"]> {
  const sessions = form.sessionsAuthorised.trim();
  const excess = form.excessPence.trim();
  return {
    payerId: form.payerId,
    policyNumber: form.policyNumber,
    authorisationCode: form.authorisationCode,
    sessionsAuthorised: sessions === "" ? null : wholeNumber(sessions),
    excessPence: excess === "" ? 0 : (parseMoney(excess) ?? unreadable),
  };
}

/** No whole number: refused beside its field with that field's own sentence. */
const unreadable = 0.5;

function wholeNumber(text: string): number {
  return /^\d{1,6}$/.test(text) ? Number(text) : unreadable;
}

/** The surgery just added, as the field holds it. */
export function surgeryOption(surgery: GpPracticeView): SurgeryOption {
  return {
    id: surgery.id,
    label: surgery.name,
    detail: [...surgery.addressLines, surgery.postcode].join(", "),
  };
}

const fieldIds: Record<string, string> = { gpPracticeId: "gpPractice" };

/** The id of the control behind a field of the contract. */
export function fieldId(field: string): string {
  const last = field.startsWith("payer.") ? field.slice("payer.".length) : (field.split(".")[0] ?? field);
  return fieldIds[last] ?? last;
}
