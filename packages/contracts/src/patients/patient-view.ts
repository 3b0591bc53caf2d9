import type { AppointmentState } from "@withy/diary/appointment-states";
import { z } from "zod";
import { idField, pageFields } from "../fields";
import type { PreferredChannel, Sex } from "./patient-input";

export const patientIdInput = z.strictObject({ patientId: idField });
export const whoLookedInput = z.strictObject({ patientId: idField, ...pageFields });

export interface NamedView {
  readonly id: string;
  readonly name: string;
}

export interface PatientPayerView {
  readonly payerId: string;
  readonly payerName: string;
  readonly kind: "insurer" | "employer";
  readonly policyNumber: string | null;
  readonly authorisationCode: string | null;
  readonly sessionsAuthorised: number | null;
  readonly excessPence: number;
}

export interface PatientAlertView {
  readonly id: string;
  readonly text: string;
  readonly isClinical: boolean;
}

export interface PatientConsentView {
  readonly kind: "treatment" | "letter-to-gp" | "email" | "text";
  readonly wordingVersion: string;
  readonly givenOn: string;
}

export interface NextVisitView {
  readonly appointmentId: string;
  readonly startsAt: string;
  readonly day: string;
  readonly time: string;
  readonly therapistName: string;
  readonly siteName: string;
  readonly state: AppointmentState;
}

/** For whoever books and treats; accounts see names, addresses and money only. */
export interface PatientCareView {
  readonly sex: Sex | null;
  readonly nhsNumber: string | null;
  readonly gpPractice: NamedView | null;
  readonly gpName: string | null;
  readonly communicationNeeds: string | null;
  readonly nextOfKin: string | null;
  readonly usualTherapist: NamedView | null;
  /** Clinical ones only for whoever may read notes. */
  readonly alerts: readonly PatientAlertView[];
  readonly consents: readonly PatientConsentView[];
  readonly nextVisit: NextVisitView | null;
}

/** Only for whoever may read notes. */
export interface PatientClinicalView {
  readonly openEpisode: {
    readonly id: string;
    readonly problem: string;
    readonly side: string;
    readonly therapistName: string;
    readonly openedOn: string;
    readonly goals: readonly { readonly text: string; readonly isMet: boolean }[];
  } | null;
  /** Drafts of the person who looks. */
  readonly draftNotes: readonly { readonly id: string; readonly visitOn: string }[];
}

/** One patient's record, built for the person who looks. */
export interface PatientView {
  readonly id: string;
  readonly version: number;
  /** "Eleri Tamworth", as it is read out. */
  readonly name: string;
  readonly givenName: string;
  readonly familyName: string;
  readonly preferredName: string | null;
  readonly bornOn: string;
  readonly ageYears: number;
  readonly phone: string | null;
  readonly email: string | null;
  readonly addressLines: readonly string[];
  readonly postcode: string | null;
  readonly preferredChannel: PreferredChannel;
  readonly homeSite: NamedView;
  readonly payer: PatientPayerView | null;
  readonly care: PatientCareView | null;
  readonly clinical: PatientClinicalView | null;
  /** Rows behind the record's tabs; null where the tab is not theirs to open. */
  readonly counts: {
    readonly episodes: number | null;
    readonly measures: number | null;
    readonly letters: number | null;
    readonly invoices: number | null;
  };
  /** How many people have opened the record; null for whoever may not ask. */
  readonly lookedAtBy: number | null;
  readonly registeredOn: string;
}

export interface LookView {
  readonly id: string;
  readonly at: string;
  readonly day: string;
  readonly time: string;
  readonly staffName: string;
  readonly jobTitle: string;
  readonly action: string;
}
